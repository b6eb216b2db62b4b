import { Injectable } from '@nestjs/common';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { type AppError, refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { type NoRight, RestoreFreed } from '../visits/restore-freed.service.js';
import { bookTwice } from '../visits/seat-taken.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { VisitsPresenter } from '../visits/visits.presenter.js';
import { canSayTestUp } from './holds.policy.js';
import { KeptReadings } from './kept-readings.service.js';
import { readinessOf, requireStanding, standingBy, standingTest } from './readiness.rules.js';
import { TestUpStatements, type UpBody } from './test-up-statements.service.js';

/**
 * A statement that reaches us when the visit is no longer what its maker saw. Its readings are kept in any case; said in time for a window
 * that the deadline freed since, it brings the window back.
 */
@Injectable()
export class LateTestUp {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly moves: VisitMoves,
    private readonly statements: TestUpStatements,
    private readonly restoring: RestoreFreed,
    private readonly kept: KeptReadings,
    private readonly presenter: VisitsPresenter,
    private readonly clock: Clock,
  ) {}

  /**
   * `refused`: what the statement met, thrown again where there is nothing to bring back, with how many readings were kept.
   * @throws not-found, not-allowed, stale-state, said-too-late, over-limit, reading-missing
   */
  async say(actor: Actor, visitId: string, body: UpBody, refused: AppError): Promise<VisitSummary> {
    // committed before anything else is asked: a refusal must not take the readings with it
    const readingsKept = await this.kept.keep(actor, visitId, body.readings ?? []);
    return bookTwice(() =>
      this.unitOfWork.run(() => this.bringBack(actor, visitId, body, { ...refused.params, readingsKept })),
    );
  }

  private async bringBack(
    actor: Actor,
    visitId: string,
    body: UpBody,
    params: Record<string, unknown>,
  ): Promise<VisitSummary> {
    const { visit, lot } = await this.moves.lockVisit(actor, visitId);
    if (!canSayTestUp(actor, lot)) refuse('not-allowed', { who: 'plumber' });
    const answeredId = await this.statements.findAnswered(visit, body.clientId);
    if (answeredId !== null) return this.presenter.present(actor, answeredId);
    const saidAt = correctedMadeAt(body.madeAt, this.clock.now());
    const right = await this.restoring.rightOf(visit, { saidAt, expectedVersion: body.expectedVersion });
    if (right === 'not-freed-by-deadline') refuse('stale-state', params);
    const readingIds = typeof right === 'string' ? right : await this.readingsInTime(visit, right.upBy);
    if (typeof readingIds === 'string') return refuse('said-too-late', { ...params, why: readingIds });
    const restoredId = await this.restore(actor, visit, { clientId: body.clientId, saidAt, readingIds });
    return this.presenter.present(actor, restoredId ?? refuse('said-too-late', { ...params, why: 'other-visit' }));
  }

  /** The readings that bore the statement out by the deadline; the tests must stand to this day, or there is nothing to look at. */
  private async readingsInTime(visit: VisitModel, upBy: Date): Promise<readonly string[] | NoRight> {
    const required = await this.statements.requiredOf(visit);
    const standing = await this.statements.standingOf(visit);
    requireStanding(required, standing.map(standingTest));
    const { missing, readingIds } = readinessOf(required, standing.map(standingBy(upBy)));
    return missing.length > 0 ? 'after-deadline' : readingIds;
  }

  private async restore(
    actor: Actor,
    freed: VisitModel,
    said: { clientId: string; saidAt: Date; readingIds: readonly string[] },
  ): Promise<string | null> {
    const by = { personId: actor.personId, role: 'plumber' };
    const visit = await this.restoring.restore(actor, freed, said.saidAt, by);
    if (visit === null) return null;
    if (visit.state === 'booked') await this.statements.makeReady(actor, visit, said);
    else await this.statements.keepEnded(actor, freed, said);
    return visit.id;
  }
}
