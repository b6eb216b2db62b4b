import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { Op } from 'sequelize';
import type { Actor } from '../common/access/actor.js';
import { Clock } from '../common/time/clock.js';
import { spanOf } from '../common/time/ranges.js';
import type { LedgerActor } from '../ledger/ledger.service.js';
import { LotsQueries } from '../lots/lots.queries.js';
import type { TakenSeat } from './booking.service.js';
import { RestoredSeat } from './restored-seat.service.js';
import { VisitEvents } from './visit-events.service.js';
import { VisitModel } from './visit.model.js';
import { VisitMoves } from './visit-moves.service.js';
import { upByOfRow } from './visits.presenter.js';
import { VisitsQueries } from './visits.queries.js';

/** What was said of a visit, and when by the clock of whoever said it, corrected. */
export interface Statement {
  readonly saidAt: Date;
  /** The version its maker saw. */
  readonly expectedVersion: number;
}

/** Why a statement keeps nothing. */
export type NoRight = 'not-freed-by-deadline' | 'after-deadline' | 'window-over';

/**
 * A test said up in time keeps its right to the window, however late the statement comes in, until the window is over. A freed visit has
 * no way back, so another visit stands in its stead: booked in the same window, or first in line where that is full by now.
 */
@Injectable()
export class RestoreFreed {
  constructor(
    @InjectModel(VisitModel) private readonly visits: typeof VisitModel,
    private readonly queries: VisitsQueries,
    private readonly lots: LotsQueries,
    private readonly seats: RestoredSeat,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly clock: Clock,
  ) {}

  /** The visit that stands in the stead of a freed one; null where none does. */
  async findSuccessorId(freedId: string): Promise<string | null> {
    return (await this.visits.findOne({ where: { restoresId: freedId } }))?.id ?? null;
  }

  /** The deadline a statement was in time for, or why it was not. It must have seen the visit as it stood when the deadline passed. */
  async rightOf(visit: VisitModel, { saidAt, expectedVersion }: Statement): Promise<{ upBy: Date } | NoRight> {
    const isOfThatVersion = visit.state === 'freed' && visit.version === expectedVersion + 1;
    if (!isOfThatVersion || !(await this.queries.isFreedByDeadline(visit.id))) return 'not-freed-by-deadline';
    if (this.clock.now() >= spanOf(visit.window).endAt) return 'window-over';
    const upBy = upByOfRow(await this.queries.getVisit(visit.id));
    const bookedAt = await this.queries.findBookedAt(visit.id);
    const isInTime = upBy !== null && saidAt <= upBy && (bookedAt === null || saidAt >= bookedAt);
    return isInTime ? { upBy } : 'after-deadline';
  }

  /**
   * The locked, freed visit again: a new one, written down and told. Null where that was done before, or somebody asked for another window
   * of the same units since. Who may is the caller's to ask, and whether the right stands.
   */
  async restore(actor: Actor, freed: VisitModel, saidAt: Date, by: LedgerActor): Promise<VisitModel | null> {
    const lot = await this.lots.lockLotFor(actor, freed.lotId);
    const isOver = (await this.findSuccessorId(freed.id)) !== null || (await this.hasOpenVisit(freed));
    if (isOver) return null;
    const seat = await this.seats.find(freed, { ...lot, departmentId: freed.departmentId });
    const visit = await this.create(freed, seat);
    await this.events.restored(visit, freed.id, saidAt, by);
    await this.moves.afterChange(visit);
    return visit;
  }

  private async hasOpenVisit({ lotId, stageCode, unitNumbers }: VisitModel): Promise<boolean> {
    const state = { [Op.in]: [...openVisitStates] };
    const where = { lotId, stageCode, state, unitNumbers: { [Op.overlap]: unitNumbers } };
    return (await this.visits.count({ where })) > 0;
  }

  private async create(freed: VisitModel, seat: TakenSeat | null): Promise<VisitModel> {
    const { startAt, endAt } = spanOf(freed.window);
    return this.visits.create({
      id: randomUUID(),
      restoresId: freed.id,
      lotId: freed.lotId,
      departmentId: freed.departmentId,
      ruleCardId: freed.ruleCardId,
      stageCode: freed.stageCode,
      unitNumbers: freed.unitNumbers,
      state: seat ? 'booked' : 'requested',
      version: 0,
      windowDate: freed.windowDate,
      windowLabel: freed.windowLabel,
      window: [startAt, endAt],
      ...(seat ?? { place: null, inspectorId: null, planned: null }),
      requestedBy: freed.requestedBy,
      requestingSide: freed.requestingSide,
      callerName: freed.callerName,
      requestedAt: freed.requestedAt,
      neededBy: freed.neededBy,
      note: freed.note,
      hasFirstPlace: true,
      isRetest: freed.isRetest,
      calendarUid: randomUUID(),
      calendarSequence: 0,
      createdAt: this.clock.now(),
    });
  }
}
