import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { sayNoLongerUp, sayTestUp, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { Ledger } from '../ledger/ledger.service.js';
import type { LotParties } from '../lots/lots.policy.js';
import { Outbox } from '../notices/outbox.service.js';
import { VisitEvents } from '../visits/visit-events.service.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { VisitsPresenter } from '../visits/visits.presenter.js';
import { canSayTestUp, downMoveOf, isVisitOfAnother } from './holds.policy.js';
import { HoldsQueries, type StandingHold } from './holds.queries.js';
import { readinessOf, type RequiredTest, requiredTests, type StandingTest } from './readiness.rules.js';
import { ReadingLog } from './reading-log.service.js';
import { TestDown } from './test-down.service.js';
import { getStage } from './test-rule.rules.js';
import { TestUpModel } from './test-up.model.js';
import { requireCurrent } from './require-current.js';

type UpBody = RouteInput<typeof sayTestUp>['body'];
type DownBody = RouteInput<typeof sayNoLongerUp>['body'];

/** The plumber's statement that the tests stand for the booked window, and its taking back. */
@Injectable()
export class TestUp {
  constructor(
    @InjectModel(TestUpModel) private readonly testUps: typeof TestUpModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly presenter: VisitsPresenter,
    private readonly ruleCards: RuleCardsQueries,
    private readonly queries: HoldsQueries,
    private readonly log: ReadingLog,
    private readonly down: TestDown,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
  ) {}

  /** @throws not-found, not-allowed, stale-state, move-not-allowed, over-limit, reading-missing, and what a reading may be refused for */
  async say(actor: Actor, visitId: string, body: UpBody): Promise<VisitSummary> {
    return this.unitOfWork.run(async () => {
      const { visit, lot } = await this.moves.lockVisit(actor, visitId);
      if (!canSayTestUp(actor, lot)) refuse('not-allowed', { who: 'plumber' });
      if (await this.isRepeated(visit, body.clientId)) return this.presenter.present(actor, visit.id);
      requireCurrent(visit, 'say-test-up', body.expectedVersion);
      const required = await this.requiredOf(visit);
      await this.addReadings(actor, visit, body);
      const readingIds = await this.requireReady(visit, required);
      await this.write(actor, visit, body, readingIds);
      return this.presenter.present(actor, visit.id);
    });
  }

  /** @throws not-found, not-allowed, visit-of-another, stale-state */
  async sayNoLonger(actor: Actor, visitId: string, body: DownBody): Promise<VisitSummary> {
    return this.unitOfWork.run(async () => {
      const { visit, lot } = await this.moves.lockVisit(actor, visitId);
      const move = downMoveOf(actor, lot, visit) ?? refuseDown(actor, lot, visit);
      const at = correctedMadeAt(body.madeAt, this.clock.now());
      const note = body.note ?? null;
      if (await this.isTakenBack(actor, visit, body.expectedVersion)) return this.presenter.present(actor, visit.id);
      await this.down.take(actor, lot, visit, { move, expectedVersion: body.expectedVersion, at, note });
      return this.presenter.present(actor, visit.id);
    });
  }

  private async isRepeated(visit: VisitModel, clientId: string): Promise<boolean> {
    const earlier = await this.testUps.findOne({ where: { clientId } });
    if (earlier !== null && earlier.visitId !== visit.id) refuse('bad-input', {}, { clientId: 'used-before' });
    return earlier !== null;
  }

  /** The same person already took it back from that very version: the same act again. */
  private async isTakenBack(actor: Actor, visit: VisitModel, expectedVersion: number): Promise<boolean> {
    if (visit.state !== 'booked' || visit.version !== expectedVersion + 1) return false;
    const last = await this.testUps.findOne({ where: { visitId: visit.id }, order: [['receivedAt', 'DESC']] });
    return last?.endedBy === actor.personId;
  }

  private async requiredOf(visit: VisitModel): Promise<RequiredTest[]> {
    const { content } = await this.ruleCards.getRuleCard(visit.ruleCardId);
    const { systems } = getStage(content, visit.stageCode);
    if (systems.length === 0) refuse('move-not-allowed', { why: 'no-test-at-this-stage' });
    return requiredTests(visit.unitNumbers, systems);
  }

  private async addReadings(actor: Actor, visit: VisitModel, body: UpBody): Promise<void> {
    const standing = await this.standingOf(visit);
    for (const [index, { holdId, madeAt, ...typed }] of (body.readings ?? []).entries()) {
      const path = `readings.${index}.`;
      const hold = standing.find((each) => each.hold.id === holdId)?.hold;
      if (hold === undefined) return refuse('bad-input', {}, { [`${path}holdId`]: 'not-standing-for-this-visit' });
      const corrected = correctedMadeAt(madeAt, this.clock.now());
      await this.log.append(hold, { ...typed, madeAt: corrected }, actor, 'plumber', path);
    }
  }

  private async requireReady(visit: VisitModel, required: readonly RequiredTest[]): Promise<readonly string[]> {
    const standing = (await this.standingOf(visit)).map(standingTest);
    const { missing, overLimit, readingIds } = readinessOf(required, standing);
    if (overLimit !== null) refuse('over-limit', { ...overLimit });
    if (missing.length > 0) refuse('reading-missing', { missing });
    return readingIds;
  }

  private standingOf(visit: VisitModel): Promise<StandingHold[]> {
    return this.queries.listStanding(visit.lotId, visit.stageCode, visit.unitNumbers, true);
  }

  private async write(actor: Actor, visit: VisitModel, body: UpBody, readingIds: readonly string[]): Promise<void> {
    const now = this.clock.now();
    const saidAt = correctedMadeAt(body.madeAt, now);
    const { expectedVersion, clientId } = body;
    await this.moves.apply(visit, 'say-test-up', { expectedVersion, changes: { readyAt: saidAt } });
    await this.testUps.create({
      id: randomUUID(),
      clientId,
      visitId: visit.id,
      saidBy: actor.personId,
      saidAt,
      receivedAt: now,
      readingIds: [...readingIds],
    });
    const payload = { visitId: visit.id, readingIds: [...readingIds], madeAt: saidAt.toISOString() };
    await this.ledger.appendToLot(visit.lotId, 'test-up', payload, { personId: actor.personId, role: 'plumber' });
    const subject = { lotId: visit.lotId, visitId: visit.id, actorId: actor.personId };
    await this.outbox.add('test-up', subject, { visit: await this.events.factsOf(visit) });
  }
}

function standingTest({ hold, readings }: StandingHold): StandingTest {
  const { unitNumber, system, medium, minimumPsi, ceilingPsi } = hold;
  return { unitNumber, system, medium, minimumPsi, ceilingPsi, readings };
}

function refuseDown(actor: Actor, lot: LotParties, visit: VisitModel): never {
  if (isVisitOfAnother(actor, lot, visit)) refuse('visit-of-another', { inspectorId: visit.inspectorId });
  return refuse('not-allowed', { who: 'plumber-or-inspector' });
}
