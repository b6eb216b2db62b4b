import { testRule, type TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import { houseGeometry, type HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { planTools, type PlanToolsGiven } from '@holdwater/shared-types/plans/plan-tools.js';
import { planWays } from '@holdwater/shared-types/plans/plan-ways.js';
import type { PlanWay, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { house as bareHouse, uuid } from '../../lots/testing/lot-fixtures';

export const ruleCardId = uuid(801);

/** The house of the mockups with its water side: plug 3 ft under the first floor, cut 21 ft and vent terminal 24.5 ft over it. */
export const measuredHouse: HouseGeometry = houseGeometry.parse({
  ...bareHouse,
  cappedVents: 1,
  pipes: [{ nominalIn: 3, material: 'pvc-sch40', bottomFt: -3, topFt: 24.5, lengthFt: 90 }],
  ...{ gaugeFt: 3.5, highestOutletFt: 17, waterLowestFittingFt: -1.5, waterPipeMaterials: ['pex'] },
  ...{ lowestRatedPsi: 126, supplyPsi: 62 },
});

/** Rules of an invented department: three ways for drains filled to their own level, water lines at 100 psi. */
export function ruleOf(system: System): TestRule {
  const drains = { acceptedMethods: ['attic-cut', 'stack-to-roof', 'laundry-box'], pressures: [] };
  const lines = { acceptedMethods: ['gauge'], pressures: [{ medium: 'water', minimumPsi: 100, preferredPsi: 120 }] };
  return testRule.parse({
    ...{ stageCode: 'rough-in', system, measuredAt: 'gauge', standMinutes: null, airOnPlastic: false },
    headRule: system === 'dwv' ? { kind: 'fill-level', feet: null } : null,
    ...(system === 'dwv' ? drains : lines),
    ...{ settleMinutes: system === 'dwv' ? 0 : 60, gaugeIncrements: [], mayStayIsolated: [], levelSeenFrom: [] },
    photoWanted: { reading: false, fix: true, takeDown: true },
  });
}

export function waysOf(system: System, house = measuredHouse, tools: PlanToolsGiven = {}): PlanWay[] {
  const rule = ruleOf(system);
  return planWays({ house, rule, isGroundwork: false, tools: planTools.parse(tools), elevationFt: 4400 });
}

/** A plan as the server tells it: worked out, not written by hand. */
export function planOf(method: PlanWay['method'], parts: Partial<TestPlan> = {}): TestPlan {
  const system = method === 'gauge' ? 'water' : 'dwv';
  const way = waysOf(system).find((each) => each.method === method);
  if (way === undefined) throw new Error(`no way ${method}`);
  return {
    ...{ id: uuid(810), lotId: uuid(17), unitNumber: 1, stageCode: 'rough-in', system, method, medium: way.medium },
    ...{ tools: planTools.parse({}), ruleCard: { id: ruleCardId, version: 6 }, geometry: measuredHouse },
    ...{ isGroundwork: false, dwv: way.dwv, water: way.water, chosenBy: 'Ruben Achterberg' },
    ...{ chosenAt: '2026-04-14T22:52:00Z', receivedAt: '2026-04-14T22:52:00Z', isCurrent: true, supersededAt: null },
    stale: [],
    ...parts,
  };
}
