import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { answerHandover } from '@holdwater/shared-types/lots/handover.contract.js';
import { type Actor, hasRole } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { HandedOverTests } from '../holds/handed-over-tests.service.js';
import type { HoldModel } from '../holds/hold.model.js';
import { Ledger } from '../ledger/ledger.service.js';
import { answeringRole } from '../lots/consents.policy.js';
import type { HandoverAsking } from '../lots/consents.queries.js';
import { LotPeopleQueries } from '../lots/lot-people.queries.js';
import { LotPartiesQueries } from '../lots/lot-parties.queries.js';
import type { LotRecord } from '../lots/lot-record.js';
import { LotModel } from '../lots/lot.model.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { Outbox } from '../notices/outbox.service.js';
import { CalendarEntries } from '../visits/calendar-entries.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { PastPartyModel } from './past-party.model.js';

type TakeOver = NonNullable<RouteInput<typeof answerHandover>['body']['takeOver']>;

export interface Handover {
  /** Locked, and as it was before. */
  readonly lot: LotRecord;
  /** The open visits of the lot, locked. */
  readonly visits: readonly VisitModel[];
  readonly asking: HandoverAsking;
  readonly takeOver: TakeOver;
}

/** Puts one party of a lot in the place of another, with all that follows, in the caller's unit of work. */
@Injectable()
export class HandOver {
  constructor(
    @InjectModel(LotModel) private readonly lotModels: typeof LotModel,
    @InjectModel(PastPartyModel) private readonly past: typeof PastPartyModel,
    private readonly lots: LotsQueries,
    private readonly parties: LotPartiesQueries,
    private readonly people: LotPeopleQueries,
    private readonly tests: HandedOverTests,
    private readonly entries: CalendarEntries,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /** Throws `party-has-visit`, `not-allowed` (only a plumber takes a test over), `bad-input`, and what a reading may be refused for. */
  async over(actor: Actor, handover: Handover): Promise<void> {
    const { lot, visits, asking, takeOver } = handover;
    if (visits.some(({ state }) => state === 'underway')) refuse('party-has-visit');
    const isPlumber = asking.kind === 'plumber';
    const standing = isPlumber ? await this.tests.lockStanding(lot.id) : [];
    this.checkTakeOver(actor, asking, standing, takeOver);
    const place = isPlumber ? { plumberId: asking.organizationId } : { builderId: asking.organizationId };
    await this.lotModels.update(place, { where: { id: lot.id } });
    await this.tests.end(actor, { ...lot, ...place }, visits, standing);
    await this.record(actor, handover);
    // only now: what the newcomer writes comes after what the one replaced may read
    for (const [index, { holdId, reading }] of takeOver.entries()) {
      const ended = standing.find(({ id }) => id === holdId) ?? refuse('internal');
      await this.tests.takeOver(actor, asking.organizationId, ended, reading, `takeOver.${index}.reading.`);
    }
    await this.tests.recompute(standing);
    await this.entries.sendAnew(visits, actor);
  }

  /** Each test once, one that stands, read since the asking: an older reading says nothing of what is taken over. */
  private checkTakeOver(
    actor: Actor,
    asking: HandoverAsking,
    standing: readonly HoldModel[],
    takeOver: TakeOver,
  ): void {
    if (takeOver.length === 0) return;
    if (!hasRole(actor, asking.organizationId, 'plumber')) refuse('not-allowed', { who: 'plumber' });
    for (const [index, { holdId, reading }] of takeOver.entries()) {
      const isRepeated = takeOver.findIndex((each) => each.holdId === holdId) !== index;
      if (isRepeated || !standing.some(({ id }) => id === holdId))
        refuse('bad-input', {}, { [`takeOver.${index}.holdId`]: 'not-standing' });
      if (correctedMadeAt(reading.madeAt, this.clock.now()) < asking.askedAt)
        refuse('bad-input', {}, { [`takeOver.${index}.reading.madeAt`]: 'before-the-asking' });
    }
  }

  private async record(actor: Actor, { lot, asking, takeOver }: Handover): Promise<void> {
    const { kind, organizationId, replacesId: formerId } = asking;
    const names = await this.parties.listOrganizations([organizationId, formerId]);
    const organizationName = names.get(organizationId)?.name ?? '';
    const formerName = names.get(formerId)?.name ?? '';
    const parties = { organizationId, organizationName, formerId, formerName, takenOver: takeOver.length };
    const who = { personId: actor.personId, role: answeringRole(actor, organizationId) };
    const untilSequence = await this.ledger.appendToLot(lot.id, 'party-replaced', { kind, ...parties }, who);
    const tractName = (await this.lots.listBriefs([lot.id])).get(lot.id)?.tractName ?? null;
    await this.past.create({
      id: randomUUID(),
      ...{ lotId: lot.id, kind, organizationId: formerId, replacedById: organizationId },
      ...{ until: this.clock.now(), untilSequence, lotNumber: lot.number, tractName, address: lot.address },
    });
    await this.outbox.add('handover', { lotId: lot.id, actorId: actor.personId }, { party: kind, ...parties });
    await this.closeToFormer(formerId);
  }

  /** Their open pages are asked again at once whether they still may look at the lot. */
  private async closeToFormer(formerId: string): Promise<void> {
    const roles = ['superintendent', 'plumber', 'helper', 'owner'] as const;
    const people = (await this.people.listPeople([formerId], roles)).get(formerId) ?? [];
    for (const { id } of people) this.changes.access({ personId: id });
  }
}
