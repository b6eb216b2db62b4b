import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { type AddedClosure, ClosureEffects, type ClosureListener } from '../departments/closure-effects.js';
import { closedSpansOf } from '../scheduling/working-time/closed-spans.js';
import { BookingQueries } from './booking.queries.js';
import { VisitEvents } from './visit-events.service.js';
import { VisitMoves } from './visit-moves.service.js';

/** A day, or a span of it, that closes frees the visits booked inside it. Requests stay with the desk; a visit underway goes on. */
@Injectable()
export class FreeByClosure implements ClosureListener, OnModuleInit {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly effects: ClosureEffects,
    private readonly booking: BookingQueries,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
  ) {}

  onModuleInit(): void {
    this.effects.register(this);
  }

  /** The day is locked first: whoever books into it at this moment either is seen here or sees the closure. */
  async afterClosureAdded(closure: AddedClosure): Promise<void> {
    await this.booking.lockDay(closure.departmentId, closure.date);
    for (const visitId of await this.listInside(closure)) {
      const visit = await this.moves.findLocked(visitId);
      if (visit?.state !== 'booked' && visit?.state !== 'ready') continue;
      await this.moves.apply(visit, 'free-closure', { expectedVersion: null, changes: { endReason: closure.why } });
      await this.events.freed(visit, closure.why, closure.actor);
    }
  }

  /** Visits of windows that share any time with the closure: such a window is not offered either. */
  private async listInside({ departmentId, zone, date, from, to }: AddedClosure): Promise<string[]> {
    const [span] = closedSpansOf({ zone, closures: [from === null || to === null ? date : { date, from, to }] }, date);
    const found = await this.sequelize.query<{ id: string }>(
      `SELECT id FROM visits WHERE department_id = :departmentId AND window_date = :date AND state IN ('booked', 'ready')
         AND (CAST(:isWholeDay AS boolean) OR "window" && tstzrange(:startAt, :endAt)) ORDER BY id`,
      {
        replacements: {
          departmentId,
          date,
          isWholeDay: from === null,
          startAt: span?.startAt ?? null,
          endAt: span?.endAt ?? null,
        },
        type: QueryTypes.SELECT,
      },
    );
    return found.map(({ id }) => id);
  }
}
