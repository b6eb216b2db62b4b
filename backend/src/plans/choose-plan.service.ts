import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { choosePlan, PlanWay, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import type { LotRecord } from '../lots/lot-record.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { geometryDigest } from './geometry-digest.js';
import { type PlanGround, PlanGrounds, waysOn } from './plan-ground.service.js';
import { canChoosePlan } from './plans.policy.js';
import { PlansPresenter } from './plans.presenter.js';
import { PlansQueries } from './plans.queries.js';
import { TestPlanModel } from './test-plan.model.js';

type Body = RouteInput<typeof choosePlan>['body'];

/** The plumber chooses how a system is put under test; what is told then is kept. */
@Injectable()
export class ChoosePlan {
  constructor(
    @InjectModel(TestPlanModel) private readonly plans: typeof TestPlanModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly lots: LotsQueries,
    private readonly queries: PlansQueries,
    private readonly grounds: PlanGrounds,
    private readonly ledger: Ledger,
    private readonly changes: Changes,
    private readonly presenter: PlansPresenter,
  ) {}

  /**
   * Throws `not-found`, `not-allowed`, `no-house`, `method-not-accepted`, `plan-not-usable` (with reasons and missing measures),
   * `reading-in-the-future`, and what `PlanGrounds.getGround` refuses.
   */
  async choose(actor: Actor, lotId: string, body: Body): Promise<TestPlan> {
    return this.unitOfWork.run(async () => {
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canChoosePlan(actor, lot)) refuse('not-allowed', { who: 'plumber' });
      const repeated = await this.queries.findByClientId(body.clientId);
      if (repeated !== null) {
        if (repeated.lotId !== lotId) refuse('bad-input', {}, { clientId: 'used-before' });
        return this.presenter.one(lot, repeated);
      }
      const ground = await this.grounds.getGround(lot, body);
      const house = ground.house ?? refuse('no-house', { unitNumber: body.unitNumber });
      const way = offeredWay(ground, body);
      return this.presenter.one(lot, await this.create(actor, lot, body, ground, house, way));
    });
  }

  private async create(
    actor: Actor,
    lot: LotRecord,
    body: Body,
    ground: PlanGround,
    house: HouseGeometry,
    way: PlanWay,
  ): Promise<TestPlanModel> {
    const now = this.clock.now();
    const { clientId, unitNumber, stageCode, system, tools } = body;
    const { method, medium, dwv, water } = way;
    const part = { lotId: lot.id, unitNumber, stageCode, system };
    await this.plans.update({ supersededAt: now }, { where: { ...part, supersededAt: null } });
    const plan = await this.plans.create({
      ...{ id: randomUUID(), clientId, ...part, method, medium, tools },
      ruleCardId: ground.ruleCard.id,
      ...{ geometry: house, geometryDigest: geometryDigest(house), isGroundwork: ground.isGroundwork },
      answer: { dwv, water },
      ...{ chosenBy: actor.personId, chosenAt: correctedMadeAt(body.madeAt, now), receivedAt: now },
      supersededAt: null,
    });
    const payload = { planId: plan.id, unitNumber, stageCode, system, method, medium };
    const told = { ...payload, ruleCardVersion: ground.ruleCard.version };
    await this.ledger.appendToLot(lot.id, 'plan-chosen', told, { personId: actor.personId, role: 'plumber' });
    this.changes.lot(lot.id, 'plans');
    return plan;
  }
}

function offeredWay(ground: PlanGround, { method, medium, tools, system }: Body): PlanWay {
  const way = waysOn(ground, tools).find((each) => each.method === method && each.medium === medium);
  if (way === undefined) {
    // a method of the other system, or one by a medium it is never filled with
    const field = (system === 'water') === (method === 'gauge') ? 'medium' : 'method';
    return refuse('bad-input', {}, { [field]: 'not-one-of-the-choices' });
  }
  if (way.isOffered) return way;
  const { reasons, missing } = way;
  if (reasons.some(({ code }) => code === 'method-not-accepted')) {
    refuse('method-not-accepted', { acceptedMethods: ground.rule.acceptedMethods }, { method: 'method-not-accepted' });
  }
  return refuse('plan-not-usable', { method, reasons, missing });
}
