import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Hold, startHold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { ClearancesService } from '../clearances/clearances.service.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { type RuleCardVersion, RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { Ledger } from '../ledger/ledger.service.js';
import type { LotRecord } from '../lots/lot-record.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { PlansQueries } from '../plans/plans.queries.js';
import type { TestPlanModel } from '../plans/test-plan.model.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { HoldEnd } from './hold-end.service.js';
import { HoldModel } from './hold.model.js';
import { canStartHold } from './holds.policy.js';
import { HoldsPresenter } from './holds.presenter.js';
import { HoldsQueries } from './holds.queries.js';
import { asPlanned, planOfTest } from './planned-test.js';
import { ReadingLog } from './reading-log.service.js';
import { TestedVisitQueries } from './tested-visit.queries.js';
import { type TestTerms, termsOf } from './test-rule.rules.js';

type Body = RouteInput<typeof startHold>['body'];

/** The plumber starts a test, with its first reading in the same act. */
@Injectable()
export class StartHold {
  constructor(
    @InjectModel(HoldModel) private readonly holds: typeof HoldModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly lots: LotsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly plans: PlansQueries,
    private readonly tested: TestedVisitQueries,
    private readonly moves: VisitMoves,
    private readonly queries: HoldsQueries,
    private readonly end: HoldEnd,
    private readonly log: ReadingLog,
    private readonly ledger: Ledger,
    private readonly clearances: ClearancesService,
    private readonly presenter: HoldsPresenter,
  ) {}

  /** @throws not-found, not-allowed, stage-unknown, method-not-accepted, hold-standing, bad-input (a plan of another part or way too), reading-out-of-gauge */
  async start(actor: Actor, lotId: string, body: Body): Promise<Hold> {
    return this.unitOfWork.run(async () => {
      const visit = await this.lockTestedVisit(actor, lotId, body);
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canStartHold(actor, lot)) refuse('not-allowed', { who: 'plumber' });
      const repeated = await this.findRepeated(lotId, body.clientId);
      if (repeated !== null) return this.presenter.one(repeated);
      await this.checkUnit(lotId, body.unitNumber);
      const { content } = await this.ruleCardFor(lot, visit);
      const plan = await this.findPlan(lotId, body);
      const planned = asPlanned(body, plan);
      const hold = await this.create(actor, lot, visit, planned, termsOf(content, planned), plan?.id ?? null);
      const { madeAt, ...first } = body.firstReading;
      const corrected = correctedMadeAt(madeAt, this.clock.now());
      await this.log.append(hold, { ...first, madeAt: corrected }, actor, 'plumber', 'firstReading.');
      await this.clearances.recompute(lotId, hold.unitNumber, hold.stageCode);
      return this.presenter.one(hold);
    });
  }

  /** Locked before the lot, as every act locks them. */
  private async lockTestedVisit(actor: Actor, lotId: string, body: Body): Promise<VisitModel | null> {
    await this.lots.getLotFor(actor, lotId);
    const open = await this.tested.findOpenVisit(lotId, body.unitNumber, body.stageCode);
    return open && this.moves.findLocked(open.id);
  }

  private async findRepeated(lotId: string, clientId: string): Promise<HoldModel | null> {
    const earlier = await this.holds.findOne({ where: { clientId } });
    if (earlier !== null && earlier.lotId !== lotId) refuse('bad-input', {}, { clientId: 'used-before' });
    return earlier;
  }

  private async checkUnit(lotId: string, unitNumber: number): Promise<void> {
    const units = (await this.lots.listUnitNumbers([lotId])).get(lotId) ?? [];
    if (!units.includes(unitNumber)) refuse('bad-input', {}, { unitNumber: 'no-such-unit' });
  }

  /** A booked visit keeps its version; without one the card in force rules. */
  private async ruleCardFor(lot: LotRecord, visit: VisitModel | null): Promise<RuleCardVersion> {
    if (visit !== null) return this.ruleCards.getRuleCard(visit.ruleCardId);
    const { departmentId } = lot;
    if (departmentId === null) return refuse('lot-without-department');
    const inForce = await this.ruleCards.listInForce([departmentId], this.clock.now());
    return inForce.get(departmentId) ?? refuse('no-rule-card');
  }

  private async findPlan(lotId: string, body: Body): Promise<TestPlanModel | null> {
    const named = body.planId ? await this.plans.findPlan(body.planId) : null;
    return planOfTest(lotId, body, named, await this.plans.findCurrent(lotId, body));
  }

  private async create(
    actor: Actor,
    lot: LotRecord,
    visit: VisitModel | null,
    body: Body,
    terms: TestTerms,
    planId: string | null,
  ): Promise<HoldModel> {
    const now = this.clock.now();
    const startedAt = correctedMadeAt(body.madeAt, now);
    const { unitNumber, stageCode, system } = body;
    const earlier = await this.queries.lockStanding(lot.id, unitNumber, stageCode, system);
    if (earlier !== null) {
      if (body.isSuperseding !== true) refuse('hold-standing', { holdId: earlier.id, ordinal: earlier.ordinal });
      await this.end.end(actor, lot, visit, earlier, { reason: 'superseded', at: startedAt, note: null });
    }
    const ordinal = (await this.queries.lastOrdinal(lot.id, unitNumber, stageCode, system)) + 1;
    const hold = await this.holds.create({
      id: randomUUID(),
      clientId: body.clientId,
      lotId: lot.id,
      unitNumber,
      stageCode,
      system,
      ordinal,
      planId,
      plumberId: lot.plumberId,
      method: body.method,
      medium: body.medium,
      gauge: body.gauge ?? null,
      tape: body.tape ?? null,
      fillLevelFt: body.fillLevelFt ?? null,
      minimumPsi: terms.minimumPsi,
      ceilingPsi: body.ceilingPsi ?? null,
      settleMinutes: terms.settleMinutes,
      state: 'standing',
      supersedesId: earlier?.id ?? null,
      startedBy: actor.personId,
      startedAt,
      receivedAt: now,
    });
    const payload = { holdId: hold.id, system, ordinal, method: hold.method, unitNumber };
    await this.ledger.appendToLot(lot.id, 'test-started', payload, { personId: actor.personId, role: 'plumber' });
    return hold;
  }
}
