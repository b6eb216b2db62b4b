import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  choosePlan,
  listPlanHistory,
  listPlans,
  readPlan,
  readPlanOffers,
  type TestPlan,
} from '@holdwater/shared-types/plans/plan.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { ChoosePlan } from './choose-plan.service.js';
import { ReadPlans } from './read-plans.service.js';

@Controller()
export class PlansController {
  constructor(
    private readonly reading: ReadPlans,
    private readonly choosing: ChoosePlan,
  ) {}

  @ContractRoute(readPlanOffers, signedIn('lots.canReadLot'))
  offers(@CurrentActor() actor: Actor, @Input() { params, body }: RouteInput<typeof readPlanOffers>) {
    return this.reading.offers(actor, params.lotId, body);
  }

  @ContractRoute(choosePlan, signedIn('plans.canChoosePlan'))
  choose(@CurrentActor() actor: Actor, @Input() { params, body }: RouteInput<typeof choosePlan>): Promise<TestPlan> {
    return this.choosing.choose(actor, params.lotId, body);
  }

  @ContractRoute(listPlans, signedIn('lots.canReadLot'))
  async list(@CurrentActor() actor: Actor, @Input() { params }: RouteInput<typeof listPlans>) {
    return { items: await this.reading.current(actor, params.lotId) };
  }

  @ContractRoute(listPlanHistory, signedIn('lots.canReadLot'))
  async history(@CurrentActor() actor: Actor, @Input() { params, query }: RouteInput<typeof listPlanHistory>) {
    return { items: await this.reading.history(actor, params.lotId, query) };
  }

  @ContractRoute(readPlan, signedIn('lots.canReadLot'))
  read(@CurrentActor() actor: Actor, @Input() { params }: RouteInput<typeof readPlan>): Promise<TestPlan> {
    return this.reading.one(actor, params.planId);
  }
}
