import type { RuleCardTouches } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RuleCardContent, TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { StandingPlan } from './rule-card-touches.queries.js';

export type UnfitReason = RuleCardTouches['unfitPlans'][number]['reason'];
type PlannedTest = Pick<StandingPlan, 'stageCode' | 'system' | 'method' | 'medium'>;

/** Why a plan made by one version does not do under another; null where it still does. The first that applies. */
export function findUnfitReason(plan: PlannedTest, by: RuleCardContent, under: RuleCardContent): UnfitReason | null {
  const [was, is] = [findTest(by, plan), findTest(under, plan)];
  if (is === undefined || !is.acceptedMethods.includes(plan.method)) return 'method';
  if (plan.system === 'water' || plan.method === 'air') {
    const [before, after] = [was, is].map((test) => minimumPsi(test, plan.medium));
    if (after === undefined) return 'medium';
    return before === after ? null : 'pressure';
  }
  const isSameLevel = was?.headRule?.kind === is.headRule?.kind && was?.headRule?.feet === is.headRule?.feet;
  return isSameLevel ? null : 'level';
}

function findTest({ tests }: RuleCardContent, { stageCode, system }: PlannedTest): TestRule | undefined {
  return tests.find((test) => test.stageCode === stageCode && test.system === system);
}

function minimumPsi(test: TestRule | undefined, medium: PlannedTest['medium']): number | undefined {
  return test?.pressures.find((each) => each.medium === medium)?.minimumPsi;
}
