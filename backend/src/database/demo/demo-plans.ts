import { randomUUID } from 'node:crypto';
import type { Medium, Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import { choosePlan, listPlans, readPlanOffers, type TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { DemoClient } from './demo-client.js';

export interface DemoPlanned {
  readonly lotId: string;
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly system: System;
  readonly method: Method;
  readonly medium: Medium;
}

/**
 * The plumber plans before putting a test up: takes the plan that is there already, else chooses the way where it is offered for this house.
 * Null where it is not: such a test was put up without a plan, as happens.
 */
export async function findDemoPlan(
  client: DemoClient,
  plumber: string,
  { lotId, method, medium, ...part }: DemoPlanned,
  madeAt: Date,
): Promise<TestPlan | null> {
  const params = { lotId };
  const { items } = await client.call(listPlans, plumber, { params });
  const earlier = items.find(
    (plan) =>
      plan.unitNumber === part.unitNumber &&
      plan.stageCode === part.stageCode &&
      plan.system === part.system &&
      plan.method === method &&
      plan.medium === medium &&
      plan.stale.length === 0,
  );
  if (earlier !== undefined) return earlier;
  const tools = { fillRateGpm: 6, waterTempF: 58 };
  const { ways } = await client.call(readPlanOffers, plumber, { params, body: { ...part, tools } });
  const way = ways.find((each) => each.method === method && each.medium === medium);
  if (way?.isOffered !== true) return null;
  const write = { clientId: randomUUID(), madeAt: madeAt.toISOString() };
  return client.call(choosePlan, plumber, { params, body: { ...write, ...part, method, medium, tools } });
}
