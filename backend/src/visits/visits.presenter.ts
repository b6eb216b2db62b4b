import { Injectable } from '@nestjs/common';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { canReadLot, type LotParties } from '../lots/lots.policy.js';
import { upByOf } from './up-by.js';
import type { VisitRow } from './visit-row.js';
import { movesFor, type VisitFacts } from './visits.policy.js';
import { VisitsQueries } from './visits.queries.js';

/** Visits as a reader sees them. */
@Injectable()
export class VisitsPresenter {
  constructor(
    private readonly queries: VisitsQueries,
    private readonly clock: Clock,
  ) {}

  /** A visit as it stands in the running transaction. Throws `not-found` unless the actor may read its lot. */
  async present(actor: Actor, visitId: string): Promise<VisitSummary> {
    const row = await this.queries.getVisit(visitId);
    if (!canReadLot(actor, partiesOfRow(row))) refuse('not-found');
    return presentVisit(row, actor, this.clock.now());
  }

  async presentAll(actor: Actor, visitIds: readonly string[]): Promise<VisitSummary[]> {
    return this.presentRows(actor, await this.queries.listByIds(visitIds));
  }

  presentRows(actor: Actor, rows: readonly VisitRow[]): VisitSummary[] {
    const now = this.clock.now();
    return rows.map((row) => presentVisit(row, actor, now));
  }
}

export function partiesOfRow({ builderId, plumberId, departmentId, mayPlumberRequest }: VisitRow): LotParties {
  return { builderId, plumberId, departmentId, mayPlumberRequest };
}

/** When the tests of a visit must be up, or null. */
export function upByOfRow(row: VisitRow): Date | null {
  const window = { date: row.windowDate, startAt: row.windowStartAt };
  return upByOf(row.readiness, { systems: row.stage?.systems ?? [] }, window, row.zone);
}

export function presentVisit(row: VisitRow, actor: Actor, now: Date): VisitSummary {
  const facts: VisitFacts = row;
  const isTested = (row.stage?.systems.length ?? 0) > 0;
  const isUp = row.state === 'ready' || row.state === 'underway';
  return {
    ...lotPart(row),
    id: row.id,
    stageCode: row.stageCode,
    stageName: row.stage?.name ?? { en: row.stageCode },
    ruleCardVersion: row.ruleCardVersion,
    unitNumbers: row.unitNumbers,
    state: row.state,
    version: row.version,
    window: windowPart(row),
    plannedStartAt: iso(row.plannedStartAt),
    plannedEndAt: iso(row.plannedEndAt),
    inspector: inspectorPart(row),
    systemsUp: systemsUp(row),
    upSince: isUp ? iso(row.readyAt) : null,
    upBy: iso(upByOfRow(row)),
    outcome: row.outcomeKind === null ? null : { kind: row.outcomeKind, reason: row.outcomeReason },
    endReason: row.endReason,
    endNote: row.endNote,
    openCorrections: row.openCorrections,
    isRetest: row.isRetest,
    hasFirstPlace: row.hasFirstPlace,
    neededBy: iso(row.neededBy),
    note: row.note,
    requestedAt: row.requestedAt.toISOString(),
    moves: movesFor(actor, facts, partiesOfRow(row), now, isTested),
  };
}

function lotPart(row: VisitRow) {
  const { lotId, lotNumber, tractName, address, builderName, plumberName, departmentId, departmentName, zone } = row;
  return { lotId, lotNumber, tractName, address, builderName, plumberName, departmentId, departmentName, zone };
}

function windowPart(row: VisitRow) {
  const [startAt, endAt] = [row.windowStartAt.toISOString(), row.windowEndAt.toISOString()];
  return { date: row.windowDate, label: row.windowLabel, startAt, endAt };
}

function inspectorPart({ inspectorId, inspectorName, inspectorPhone }: VisitRow) {
  return inspectorId === null ? null : { id: inspectorId, name: inspectorName ?? '', phone: inspectorPhone };
}

/** What is required, unit by unit, and whether it stands. */
function systemsUp(row: VisitRow): VisitSummary['systemsUp'] {
  const standing = row.standing ?? [];
  return row.unitNumbers.flatMap((unitNumber) =>
    (row.stage?.systems ?? []).map((system) => ({
      unitNumber,
      system,
      isUp: standing.some((hold) => hold.unitNumber === unitNumber && hold.system === system),
    })),
  );
}

function iso(at: Date | null): string | null {
  return at?.toISOString() ?? null;
}
