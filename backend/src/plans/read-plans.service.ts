import { Injectable } from '@nestjs/common';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import type { readPlanOffers, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { PlanGrounds, waysOn } from './plan-ground.service.js';
import { PlansPresenter } from './plans.presenter.js';
import { type PlannedPart, PlansQueries } from './plans.queries.js';

type Offers = RouteAnswer<typeof readPlanOffers>;

/** What all three parties read of the plans of a lot. */
@Injectable()
export class ReadPlans {
  constructor(
    private readonly lots: LotsQueries,
    private readonly queries: PlansQueries,
    private readonly grounds: PlanGrounds,
    private readonly presenter: PlansPresenter,
  ) {}

  /** Throws `not-found`, and what `PlanGrounds.getGround` refuses. */
  async offers(actor: Actor, lotId: string, body: RouteInput<typeof readPlanOffers>['body']): Promise<Offers> {
    const lot = await this.lots.getLotFor(actor, lotId);
    const ground = await this.grounds.getGround(lot, body);
    const { ruleCard, isGroundwork, house } = ground;
    return {
      ruleCard: { id: ruleCard.id, version: ruleCard.version },
      isGroundwork,
      hasHouse: house !== null,
      ways: waysOn(ground, body.tools),
    };
  }

  /** Throws `not-found`. */
  async current(actor: Actor, lotId: string): Promise<TestPlan[]> {
    const lot = await this.lots.getLotFor(actor, lotId);
    return this.presenter.many(lot, await this.queries.listCurrent(lotId));
  }

  /** Throws `not-found`. */
  async history(actor: Actor, lotId: string, part: PlannedPart): Promise<TestPlan[]> {
    const lot = await this.lots.getLotFor(actor, lotId);
    return this.presenter.many(lot, await this.queries.listHistory(lotId, part));
  }

  /** Throws `not-found`, for a plan of a lot the actor may not read too. */
  async one(actor: Actor, planId: string): Promise<TestPlan> {
    const plan = (await this.queries.findPlan(planId)) ?? refuse('not-found');
    return this.presenter.one(await this.lots.getLotFor(actor, plan.lotId), plan);
  }
}
