import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { sayTestUp } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { Ledger } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { RestoreFreed } from '../visits/restore-freed.service.js';
import { VisitEvents } from '../visits/visit-events.service.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { HoldsQueries, type StandingHold } from './holds.queries.js';
import { type RequiredTest, requiredTests } from './readiness.rules.js';
import { getStage } from './test-rule.rules.js';
import { TestUpModel } from './test-up.model.js';

export type UpBody = RouteInput<typeof sayTestUp>['body'];

/** What is said of a visit's tests, and on which readings. */
export interface NewStatement {
  readonly clientId: string;
  readonly saidAt: Date;
  readonly readingIds: readonly string[];
}

/** Statements that the tests are up: what they rest on, and how they are written. Inside a unit of work, the visit locked. */
@Injectable()
export class TestUpStatements {
  constructor(
    @InjectModel(TestUpModel) private readonly testUps: typeof TestUpModel,
    private readonly ruleCards: RuleCardsQueries,
    private readonly queries: HoldsQueries,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly restoring: RestoreFreed,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly clock: Clock,
  ) {}

  /**
   * The visit a statement sent again is answered with: the same one, or the one that stands in its stead. Null for a new statement.
   * @throws bad-input where the client id was used on another visit
   */
  async findAnswered(visit: VisitModel, clientId: string): Promise<string | null> {
    const earlier = await this.testUps.findOne({ where: { clientId } });
    if (earlier === null) return null;
    const successorId = await this.restoring.findSuccessorId(visit.id);
    if (earlier.visitId !== visit.id && earlier.visitId !== successorId)
      refuse('bad-input', {}, { clientId: 'used-before' });
    return successorId ?? visit.id;
  }

  /** @throws move-not-allowed at a stage without a test */
  async requiredOf(visit: VisitModel): Promise<RequiredTest[]> {
    const { content } = await this.ruleCards.getRuleCard(visit.ruleCardId);
    const { systems } = getStage(content, visit.stageCode);
    if (systems.length === 0) refuse('move-not-allowed', { why: 'no-test-at-this-stage' });
    return requiredTests(visit.unitNumbers, systems);
  }

  /** The tests that stand for a visit, locked. */
  standingOf(visit: VisitModel): Promise<StandingHold[]> {
    return this.queries.listStanding(visit.lotId, visit.stageCode, visit.unitNumbers, true);
  }

  /** Makes a booked visit ready. `expectedVersion` null where the visit was made in the same act. @throws stale-state */
  async makeReady(
    actor: Actor,
    visit: VisitModel,
    said: NewStatement,
    expectedVersion: number | null = null,
  ): Promise<void> {
    await this.moves.apply(visit, 'say-test-up', { expectedVersion, changes: { readyAt: said.saidAt } });
    await this.write(actor, visit, said, null);
    const subject = { lotId: visit.lotId, visitId: visit.id, actorId: actor.personId };
    await this.outbox.add('test-up', subject, { visit: await this.events.factsOf(visit) });
  }

  /** Keeps a statement whose window is gone, over as soon as it is written. */
  keepEnded(actor: Actor, visit: VisitModel, said: NewStatement): Promise<void> {
    return this.write(actor, visit, said, 'window-gone');
  }

  private async write(actor: Actor, visit: VisitModel, said: NewStatement, endNote: string | null): Promise<void> {
    const now = this.clock.now();
    const readingIds = [...said.readingIds];
    await this.testUps.create({
      id: randomUUID(),
      clientId: said.clientId,
      visitId: visit.id,
      saidBy: actor.personId,
      saidAt: said.saidAt,
      receivedAt: now,
      readingIds,
      ...(endNote !== null && { endedAt: now, endedBy: actor.personId, endNote }),
    });
    const payload = { visitId: visit.id, readingIds, madeAt: said.saidAt.toISOString() };
    await this.ledger.appendToLot(visit.lotId, 'test-up', payload, { personId: actor.personId, role: 'plumber' });
  }
}
