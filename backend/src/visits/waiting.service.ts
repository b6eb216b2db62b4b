import { Injectable } from '@nestjs/common';
import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Clock } from '../common/time/clock.js';
import { actorIn, readerIdsOf } from './reader.js';
import { VisitsQueries } from './visits.queries.js';
import { WaitingQueries } from './waiting.queries.js';
import { inOrder, itemOfConsents, itemOfMissingWindow, itemsOfCorrections, itemsOfVisit } from './waiting.rules.js';

/** A stage nobody asked a window for in so long is not waited for any more. */
const longestWaitMs = 120 * 24 * 3_600_000;

/** What a person has to do, and what they wait for. */
@Injectable()
export class Waiting {
  constructor(
    private readonly visits: VisitsQueries,
    private readonly queries: WaitingQueries,
    private readonly clock: Clock,
  ) {}

  /** Throws `not-found` for an organization the reader does not belong to. */
  async read(reader: Actor, organizationId: string | undefined): Promise<{ items: WaitingItem[] }> {
    const readerIds = readerIdsOf(reader, organizationId);
    const actor = actorIn(reader, readerIds);
    const now = this.clock.now();
    const open = await this.visits.listOpen(readerIds);
    const comingTo = (lotId: string, stageCode: string) =>
      open.find((row) => row.lotId === lotId && row.stageCode === stageCode) ?? null;
    const corrections = await this.queries.listCorrections(readerIds);
    const withoutWindow = await this.queries.listWithoutWindow(readerIds, sinceOf(now));
    const consents = await this.queries.listConsents(readerIds);
    return {
      items: inOrder([
        ...open.flatMap((row) => itemsOfVisit(row, actor, now)),
        ...corrections.flatMap((found) => itemsOfCorrections(found, comingTo(found.id, found.stageCode), actor, now)),
        ...withoutWindow.map((found) => itemOfMissingWindow(found, actor)),
        ...consents.map((found) => itemOfConsents(found, actor, readerIds)),
      ]),
    };
  }
}

function sinceOf(now: Date): string {
  return new Date(now.getTime() - longestWaitMs).toISOString().slice(0, 10);
}
