import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type {
  declineVisit,
  freeVisit,
  setNotReached,
  VisitSummary,
  withdrawVisit,
} from '@holdwater/shared-types/visits/visit.contract.js';
import type { VisitMove } from '@holdwater/shared-types/visits/visit.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../common/access/actor.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import type { LedgerActor } from '../ledger/ledger.service.js';
import type { VisitChanges } from './move-consequences.js';
import { actingSide, requireMove } from './require-move.js';
import { VisitEvents } from './visit-events.service.js';
import type { VisitModel } from './visit.model.js';
import { VisitMoves } from './visit-moves.service.js';
import { VisitsPresenter } from './visits.presenter.js';

interface Ending {
  readonly move: VisitMove;
  readonly expectedVersion: number;
  readonly changes: VisitChanges;
  /** Writes it down; `wasBooked`: it stood in calendars until now. */
  readonly tell: (
    visit: VisitModel,
    by: LedgerActor,
    before: { wasBooked: boolean; inspectorId: string | null },
  ) => Promise<void>;
}

/** Ends a visit, or gives it back to the requests. All throw `not-found`, `not-allowed`, `stale-state`. */
@Injectable()
export class EndVisit {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly presenter: VisitsPresenter,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  async withdraw(
    actor: Actor,
    visitId: string,
    { expectedVersion, reason, note }: RouteInput<typeof withdrawVisit>['body'],
  ): Promise<VisitSummary> {
    return this.end(actor, visitId, {
      move: 'withdraw',
      expectedVersion,
      changes: { endReason: reason, endNote: note ?? null },
      tell: (visit, by, { wasBooked }) => this.events.withdrawn(visit, reason, wasBooked, by),
    });
  }

  async decline(
    actor: Actor,
    visitId: string,
    { expectedVersion, reason }: RouteInput<typeof declineVisit>['body'],
  ): Promise<VisitSummary> {
    return this.end(actor, visitId, {
      move: 'decline',
      expectedVersion,
      changes: { endReason: reason, endNote: null },
      tell: (visit, by) => this.events.declined(visit, reason, by),
    });
  }

  async free(
    actor: Actor,
    visitId: string,
    { expectedVersion, reason }: RouteInput<typeof freeVisit>['body'],
  ): Promise<VisitSummary> {
    return this.end(actor, visitId, {
      move: 'free-closure',
      expectedVersion,
      changes: { endReason: reason },
      tell: (visit, by) => this.events.freed(visit, reason, by),
    });
  }

  /** Keeps first place. What the plumber said of the test is over with the window it was said for; the test itself may go on standing. */
  async setNotReached(
    actor: Actor,
    visitId: string,
    { expectedVersion, note }: RouteInput<typeof setNotReached>['body'],
  ): Promise<VisitSummary> {
    return this.end(actor, visitId, {
      move: 'not-reached',
      expectedVersion,
      changes: { endReason: 'not-reached', endNote: note ?? null },
      tell: async (visit, by, { inspectorId }) => {
        await this.endTestUp(visit.id, by.personId);
        await this.events.notReached(visit, inspectorId, by);
      },
    });
  }

  private async end(
    actor: Actor,
    visitId: string,
    { move, expectedVersion, changes, tell }: Ending,
  ): Promise<VisitSummary> {
    return this.unitOfWork.run(async () => {
      const locked = await this.moves.lockVisit(actor, visitId);
      requireMove(actor, move, locked);
      const { visit, lot } = locked;
      const before = { wasBooked: visit.state !== 'requested', inspectorId: visit.inspectorId };
      const role = move === 'withdraw' ? actingSide(actor, visit, lot) : 'desk';
      await this.moves.apply(visit, move, { expectedVersion, changes });
      await tell(visit, { personId: actor.personId, role }, before);
      return this.presenter.present(actor, visitId);
    });
  }

  private async endTestUp(visitId: string, personId: string): Promise<void> {
    await this.sequelize.query(
      'UPDATE test_ups SET ended_at = :now, ended_by = :personId WHERE visit_id = :visitId AND ended_at IS NULL',
      {
        replacements: { visitId, personId, now: this.clock.now() },
        type: QueryTypes.UPDATE,
      },
    );
  }
}
