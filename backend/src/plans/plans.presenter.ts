import { Injectable } from '@nestjs/common';
import type { StaleReason, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import type { LotRecord } from '../lots/lot-record.js';
import { geometryDigest } from './geometry-digest.js';
import { PlanGrounds, rulingCardId, type RulingCards } from './plan-ground.service.js';
import { PlansQueries, type UnitHouse } from './plans.queries.js';
import type { TestPlanModel } from './test-plan.model.js';

/** Shows plans of one lot, each as it was told, and of the current ones what has changed since. */
@Injectable()
export class PlansPresenter {
  constructor(
    private readonly queries: PlansQueries,
    private readonly grounds: PlanGrounds,
    private readonly ruleCards: RuleCardsQueries,
  ) {}

  async one(lot: LotRecord, plan: TestPlanModel): Promise<TestPlan> {
    const [shown] = await this.many(lot, [plan]);
    if (shown === undefined) throw new Error('one plan in, one plan out');
    return shown;
  }

  async many(lot: LotRecord, plans: readonly TestPlanModel[]): Promise<TestPlan[]> {
    if (plans.length === 0) return [];
    const cards = await this.grounds.readRulingCards(lot);
    const houses = await this.queries.listHouses(lot.id);
    const versions = await this.ruleCards.listRuleCards([...new Set(plans.map(({ ruleCardId }) => ruleCardId))]);
    const names = await this.queries.listNames(plans.map(({ chosenBy }) => chosenBy));
    return plans.map((plan) => ({
      ...{ id: plan.id, lotId: plan.lotId, unitNumber: plan.unitNumber, stageCode: plan.stageCode },
      ...{ system: plan.system, method: plan.method, medium: plan.medium, tools: plan.tools },
      ruleCard: { id: plan.ruleCardId, version: versions.get(plan.ruleCardId)?.version ?? 0 },
      ...{ geometry: plan.geometry, isGroundwork: plan.isGroundwork, ...plan.answer },
      chosenBy: names.get(plan.chosenBy) ?? '',
      chosenAt: plan.chosenAt.toISOString(),
      receivedAt: plan.receivedAt.toISOString(),
      isCurrent: plan.supersededAt === null,
      supersededAt: plan.supersededAt?.toISOString() ?? null,
      stale: plan.supersededAt === null ? staleOf(plan, houses, cards) : [],
    }));
  }
}

function staleOf(plan: TestPlanModel, houses: readonly UnitHouse[], cards: RulingCards): StaleReason[] {
  const house = houses.find(({ number }) => number === plan.unitNumber)?.geometry ?? null;
  const isOtherHouse = house === null || geometryDigest(house) !== plan.geometryDigest;
  const isOtherCard = rulingCardId(cards, plan) !== plan.ruleCardId;
  return [
    ...(isOtherHouse ? (['geometry-changed'] as const) : []),
    ...(isOtherCard ? (['rule-card-changed'] as const) : []),
  ];
}
