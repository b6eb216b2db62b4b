import { Injectable } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { beginVisit, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { undoBeginSeconds } from '@holdwater/shared-types/visits/visit.states.js';
import { ExclusionConstraintError } from 'sequelize';
import { AccountsQueries } from '../accounts/accounts.queries.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { spanOf } from '../common/time/ranges.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { requireCurrent } from '../holds/require-current.js';
import { Ledger } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { VisitEvents } from '../visits/visit-events.service.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { VisitsPresenter } from '../visits/visits.presenter.js';
import { canInspect, isOwnVisit } from './outcomes.policy.js';

type Body = RouteInput<typeof beginVisit>['body'];

/** The inspector is there: begins a visit of the own run, or one of another taken over knowingly; and takes it back within a minute. */
@Injectable()
export class BeginVisit {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly presenter: VisitsPresenter,
    private readonly accounts: AccountsQueries,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
  ) {}

  /** @throws not-found, not-allowed, stale-state, visit-of-another, window-not-open */
  async begin(actor: Actor, visitId: string, body: Body): Promise<VisitSummary> {
    return this.unitOfWork.run(async () => {
      const { visit, lot } = await this.moves.lockVisit(actor, visitId);
      if (!canInspect(actor, lot)) refuse('not-allowed', { who: 'inspector' });
      if (isBegunByThisAct(actor, visit, body.expectedVersion)) return this.presenter.present(actor, visit.id);
      requireCurrent(visit, 'begin', body.expectedVersion);
      const formerInspectorId = isOwnVisit(actor, visit) ? null : visit.inspectorId;
      if (formerInspectorId !== null && body.isTakingOver !== true) await this.refuseOfAnother(visit);
      const at = correctedMadeAt(body.madeAt, this.clock.now());
      requireTime(visit, at);
      await this.apply(actor, visit, body.expectedVersion, at);
      await this.tell(actor, visit, formerInspectorId);
      return this.presenter.present(actor, visit.id);
    });
  }

  /** By the clock, from the moment it was begun. @throws not-found, not-allowed, stale-state, visit-of-another, undo-too-late */
  async undo(actor: Actor, visitId: string, expectedVersion: number): Promise<VisitSummary> {
    return this.unitOfWork.run(async () => {
      const { visit, lot } = await this.moves.lockVisit(actor, visitId);
      if (!canInspect(actor, lot)) refuse('not-allowed', { who: 'inspector' });
      requireCurrent(visit, 'undo-begin', expectedVersion);
      if (visit.begunBy !== actor.personId) await this.refuseOfAnother(visit);
      const sinceMs = this.clock.now().getTime() - (visit.begunAt?.getTime() ?? 0);
      if (sinceMs > undoBeginSeconds * 1000) refuse('undo-too-late', { seconds: undoBeginSeconds });
      await this.moves.apply(visit, 'undo-begin', { expectedVersion });
      const by = { personId: actor.personId, role: 'inspector' };
      await this.ledger.appendToLot(visit.lotId, 'visit-begin-undone', { visitId: visit.id }, by);
      return this.presenter.present(actor, visit.id);
    });
  }

  /** Taken over, the planned span stays; it may not overlap another of the new inspector, and the database itself sees to that. */
  private async apply(actor: Actor, visit: VisitModel, expectedVersion: number, at: Date): Promise<void> {
    const changes = { begunAt: at, begunBy: actor.personId, inspectorId: actor.personId };
    try {
      await this.moves.apply(visit, 'begin', { expectedVersion, changes });
    } catch (error) {
      if (error instanceof ExclusionConstraintError) refuse('visit-of-another', { why: 'own-visit-at-that-time' });
      throw error;
    }
  }

  private async tell(actor: Actor, visit: VisitModel, formerInspectorId: string | null): Promise<void> {
    const payload = { visitId: visit.id, takenOver: formerInspectorId !== null };
    await this.ledger.appendToLot(visit.lotId, 'visit-begun', payload, { personId: actor.personId, role: 'inspector' });
    const subject = { lotId: visit.lotId, visitId: visit.id, actorId: actor.personId };
    await this.outbox.add('visit-underway', subject, {
      visit: { ...(await this.events.factsOf(visit)), formerInspectorId },
    });
  }

  private async refuseOfAnother(visit: VisitModel): Promise<never> {
    const { inspectorId } = visit;
    const persons = await this.accounts.getPersons(inspectorId === null ? [] : [inspectorId]);
    return refuse('visit-of-another', { inspectorName: inspectorId === null ? null : persons.get(inspectorId)?.name });
  }
}

/** Before the window only with the test up. */
function requireTime(visit: VisitModel, at: Date): void {
  const opensAt = spanOf(visit.window).startAt;
  if (visit.state !== 'ready' && at < opensAt) refuse('window-not-open', { opensAt: opensAt.toISOString() });
}

/** A start sent twice: the same person already began it from the very version named. */
function isBegunByThisAct(actor: Actor, visit: VisitModel, expectedVersion: number): boolean {
  return visit.state === 'underway' && visit.begunBy === actor.personId && visit.version === expectedVersion + 1;
}
