import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { stateAfter, type VisitMove, type VisitState } from '@holdwater/shared-types/visits/visit.states.js';
import { ClearancesService } from '../clearances/clearances.service.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { canReadLot, type LotParties } from '../lots/lots.policy.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { nextCalendarSequence } from './calendar-sequence.js';
import { consequencesOf, type VisitChanges } from './move-consequences.js';
import { VisitModel } from './visit.model.js';

export interface LockedVisit {
  visit: VisitModel;
  /** Its parties; `departmentId` is the visit's own department. */
  lot: LotParties;
}

export interface MoveOptions {
  /** The version the mover decided on; null where no person decides (the deadline, a test that ended under a visit). */
  expectedVersion: number | null;
  changes?: VisitChanges;
}

/** The only place where a visit changes its state. Always inside the unit of work of the act itself. */
@Injectable()
export class VisitMoves {
  constructor(
    @InjectModel(VisitModel) private readonly visits: typeof VisitModel,
    private readonly lots: LotsQueries,
    private readonly clearances: ClearancesService,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /** The visit with its row locked until the end of the transaction. Throws `not-found` unless the actor may read its lot. */
  async lockVisit(actor: Actor, visitId: string): Promise<LockedVisit> {
    const visit = (await this.findLocked(visitId)) ?? refuse('not-found');
    const lot = await this.partiesOf(visit);
    if (!canReadLot(actor, lot)) refuse('not-found');
    return { visit, lot };
  }

  /** The parties a visit's policies look at. */
  async partiesOf(visit: Pick<VisitModel, 'lotId' | 'departmentId'>): Promise<LotParties> {
    return { ...(await this.lots.partiesOf(visit.lotId)), departmentId: visit.departmentId };
  }

  /** As `lockVisit`, for acts without a person. */
  async findLocked(visitId: string): Promise<VisitModel | null> {
    return this.visits.findByPk(visitId, { lock: true });
  }

  /**
   * Makes a move of the table. Throws `stale-state` with what the visit is now when the table has no such move from here or the version
   * is another one. Writes what follows of itself (see `consequencesOf`), the version, the calendar SEQUENCE, and works the plumbing state
   * of its units out anew. Ledger and outbox are the caller's. Changes the given instance too.
   */
  async apply(visit: VisitModel, move: VisitMove, { expectedVersion, changes = {} }: MoveOptions): Promise<VisitModel> {
    const to = this.requireCurrent(visit, move, expectedVersion);
    const values = {
      ...consequencesOf(move, visit.state, to, this.clock.now()),
      ...changes,
      state: to,
      version: visit.version + 1,
    };
    const calendarSequence = nextCalendarSequence(visit, {
      state: to,
      window: values.window ?? visit.window,
      hasFirstPlace: values.hasFirstPlace ?? visit.hasFirstPlace,
    });
    const [count] = await this.visits.update(
      { ...values, calendarSequence },
      { where: { id: visit.id, version: visit.version } },
    );
    if (count === 0) refuseStale((await this.visits.findByPk(visit.id)) ?? visit);
    visit.set({ ...values, calendarSequence });
    await this.afterChange(visit);
    return visit;
  }

  /** Where a move would lead. Throws `stale-state` as `apply` does; for acts that have more to ask before they change anything. */
  requireCurrent(visit: VisitModel, move: VisitMove, expectedVersion: number | null): VisitState {
    const to = stateAfter(visit.state, move, visit.begunFrom ?? 'booked');
    const isOtherVersion = expectedVersion !== null && expectedVersion !== visit.version;
    return to === null || isOtherVersion ? refuseStale(visit) : to;
  }

  /** What every change of a visit brings with it: the plumbing state of its units, and the pages that look at its lot. */
  async afterChange(visit: VisitModel): Promise<void> {
    for (const unitNumber of visit.unitNumbers)
      await this.clearances.recompute(visit.lotId, unitNumber, visit.stageCode);
    this.changes.lot(visit.lotId, 'visits', 'lot');
  }
}

function refuseStale(visit: Pick<VisitModel, 'state' | 'version'>): never {
  return refuse('stale-state', { is: visit.state, version: visit.version });
}
