import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { startHold } from '@holdwater/shared-types/holds/hold.contract.js';
import { refuse } from '../common/errors/app-error.js';
import type { TestPlanModel } from '../plans/test-plan.model.js';
import { isLevelTest } from './reading.rules.js';

type Body = RouteInput<typeof startHold>['body'];

/**
 * The plan a test is started by: the one named, or the current one where the test goes the way it says. A named plan may have been superseded
 * meanwhile: what stands in the field stands by what was known there. Throws `bad-input` for a plan of another part, or of another way.
 */
export function planOfTest(
  lotId: string,
  body: Body,
  named: TestPlanModel | null,
  current: TestPlanModel | null,
): TestPlanModel | null {
  const goesBy = (plan: TestPlanModel): boolean => plan.method === body.method && plan.medium === body.medium;
  if (body.planId === undefined || body.planId === null) return current !== null && goesBy(current) ? current : null;
  const isOfPart =
    named !== null &&
    named.lotId === lotId &&
    named.unitNumber === body.unitNumber &&
    named.stageCode === body.stageCode &&
    named.system === body.system;
  if (!isOfPart) return refuse('bad-input', {}, { planId: 'no-such-plan' });
  if (!goesBy(named))
    refuse('bad-input', {}, { [named.method === body.method ? 'medium' : 'method']: 'not-as-planned' });
  return named;
}

/** The test with the plan's values where none were told: what was really filled to and read on goes before what was planned. */
export function asPlanned(body: Body, plan: TestPlanModel | null): Body {
  if (plan === null) return body;
  const { dwv, water } = plan.answer;
  return {
    ...body,
    fillLevelFt: body.fillLevelFt ?? dwv?.fillLevelFt ?? null,
    ceilingPsi: body.ceilingPsi ?? water?.ceilingPsi ?? null,
    gauge: body.gauge ?? (isLevelTest(body) ? null : plan.tools.gauge),
  };
}
