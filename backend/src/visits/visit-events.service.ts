import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { spanOf } from '../common/time/ranges.js';
import { Ledger, type LedgerActor } from '../ledger/ledger.service.js';
import type { VisitEventFacts } from '../notices/outbox.kinds.js';
import { Outbox } from '../notices/outbox.service.js';
import type { VisitModel } from './visit.model.js';

/** Where a visit stood before a change. */
export interface VisitBefore {
  readonly startAt: string;
  readonly endAt: string;
  readonly inspectorId: string | null;
}

/** Writes what happened to a visit into its lot's ledger and into the outbox, once each, inside the unit of work of the change. */
@Injectable()
export class VisitEvents {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
  ) {}

  /** What the calendar entry of a visit says now, for an event's payload. */
  async factsOf(visit: VisitModel, inspectorId: string | null = visit.inspectorId): Promise<VisitEventFacts> {
    const planned = visit.planned ? spanOf(visit.planned) : null;
    return {
      ...windowOf(visit),
      calendarSequence: visit.calendarSequence,
      inspectorName: inspectorId === null ? null : await this.nameOf(inspectorId),
      plannedStartAt: planned?.startAt.toISOString() ?? null,
    };
  }

  /** A request that waits for the desk. One that books at once is told as booked. */
  async requested(visit: VisitModel, by: LedgerActor): Promise<void> {
    await this.logRequest(visit, by);
    if (visit.state === 'requested')
      await this.outbox.add('visit-requested', subjectOf(visit, by), { visit: await this.factsOf(visit) });
    else await this.booked(visit, by);
  }

  async booked(visit: VisitModel, by: LedgerActor): Promise<void> {
    const facts = await this.factsOf(visit);
    const { startAt, endAt } = facts;
    const payload = {
      visitId: visit.id,
      stageCode: visit.stageCode,
      startAt,
      endAt,
      inspectorName: facts.inspectorName ?? '',
    };
    await this.ledger.appendToLot(visit.lotId, 'visit-booked', payload, by);
    await this.outbox.add('visit-booked', subjectOf(visit, by), { visit: facts });
  }

  async moved(visit: VisitModel, before: VisitBefore, by: LedgerActor): Promise<void> {
    const facts = await this.factsOf(visit);
    const payload = { visitId: visit.id, fromStartAt: before.startAt, startAt: facts.startAt, endAt: facts.endAt };
    await this.ledger.appendToLot(visit.lotId, 'visit-moved', payload, by);
    const formerInspectorId = before.inspectorId === visit.inspectorId ? null : before.inspectorId;
    await this.outbox.add('visit-moved', subjectOf(visit, by), {
      visit: { ...facts, formerInspectorId },
      from: { startAt: before.startAt, endAt: before.endAt },
      isBooked: visit.state !== 'requested',
    });
  }

  async withdrawn(visit: VisitModel, reason: string, wasBooked: boolean, by: LedgerActor): Promise<void> {
    await this.ledger.appendToLot(visit.lotId, 'visit-withdrawn', { visitId: visit.id, reason }, by);
    await this.outbox.add('visit-withdrawn', subjectOf(visit, by), {
      visit: await this.factsOf(visit),
      reason,
      wasBooked,
    });
  }

  async declined(visit: VisitModel, reason: string, by: LedgerActor): Promise<void> {
    await this.ledger.appendToLot(visit.lotId, 'visit-declined', { visitId: visit.id, reason }, by);
    await this.outbox.add('visit-declined', subjectOf(visit, by), { visit: await this.factsOf(visit), reason });
  }

  /** By the desk, or by the deadline: then nobody acts. */
  async freed(visit: VisitModel, reason: string, by: LedgerActor | null): Promise<void> {
    await this.ledger.appendToLot(visit.lotId, 'visit-freed', { visitId: visit.id, reason }, by);
    await this.outbox.add('visit-freed', subjectOf(visit, by), { visit: await this.factsOf(visit), reason });
  }

  async notReached(visit: VisitModel, formerInspectorId: string | null, by: LedgerActor): Promise<void> {
    await this.ledger.appendToLot(visit.lotId, 'visit-not-reached', { visitId: visit.id }, by);
    const facts = await this.factsOf(visit, formerInspectorId);
    await this.outbox.add('visit-not-reached', subjectOf(visit, by), { visit: { ...facts, formerInspectorId } });
  }

  /** A visit in the stead of one its deadline had freed: booked again, or first in line for another window. */
  async restored(visit: VisitModel, freedVisitId: string, saidAt: Date, by: LedgerActor): Promise<void> {
    const facts = await this.factsOf(visit);
    const { startAt, endAt, inspectorName } = facts;
    const told = { visitId: visit.id, freedVisitId, stageCode: visit.stageCode, startAt, endAt };
    const saidAtText = saidAt.toISOString();
    if (visit.state === 'requested') {
      await this.ledger.appendToLot(visit.lotId, 'visit-first-in-line', { ...told, madeAt: saidAtText }, by);
      await this.outbox.add('visit-first-in-line', subjectOf(visit, by), { visit: facts });
      return;
    }
    const payload = { ...told, madeAt: saidAtText, inspectorName: inspectorName ?? '' };
    await this.ledger.appendToLot(visit.lotId, 'visit-restored', payload, by);
    await this.outbox.add('visit-restored', subjectOf(visit, by), { visit: facts });
  }

  private async logRequest(visit: VisitModel, by: LedgerActor): Promise<void> {
    const payload = { visitId: visit.id, stageCode: visit.stageCode, ...windowOf(visit), callerName: visit.callerName };
    await this.ledger.appendToLot(visit.lotId, 'visit-requested', payload, by);
  }

  private async nameOf(personId: string): Promise<string | null> {
    const [person] = await this.sequelize.query<{ name: string }>('SELECT name FROM persons WHERE id = :personId', {
      replacements: { personId },
      type: QueryTypes.SELECT,
    });
    return person?.name ?? null;
  }
}

/** Where a visit stands, kept before it changes. */
export function beforeOf(visit: VisitModel): VisitBefore {
  return { ...windowOf(visit), inspectorId: visit.inspectorId };
}

function windowOf(visit: VisitModel): { startAt: string; endAt: string } {
  const { startAt, endAt } = spanOf(visit.window);
  return { startAt: startAt.toISOString(), endAt: endAt.toISOString() };
}

function subjectOf(visit: VisitModel, by: LedgerActor | null) {
  return { lotId: visit.lotId, visitId: visit.id, actorId: by?.personId ?? null };
}
