import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import { dwvMethods } from '@holdwater/shared-types/holds/hold.states.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { dwvPlanInput, type DwvPlan } from '@holdwater/shared-types/hydraulics/dwv-plan.contract.js';
import { planDwv } from '@holdwater/shared-types/hydraulics/dwv-plan.js';
import type { CutawayHouse } from '../../drawings/cutaway';

/** One way to put the drains under test here: its plan, or null where the house is not known well enough to work one out. */
export interface DwvWay {
  readonly method: DwvMethod;
  readonly isAccepted: boolean;
  readonly plan: DwvPlan | null;
}

/** The plan of one method for this house under this rule; null where a measure it needs is missing. */
export function findDwvPlan(house: HouseGeometry, method: DwvMethod, rule: TestRule): DwvPlan | null {
  const air = rule.pressures.find(({ medium }) => medium === 'air');
  const { floors, lowestFittingFt, highestFittingFt, ventTerminalFt, cappedVents, atticCutFt, standpipeFt } = house;
  const { laundry, pipeMaterial, plugs, pipes, elevationFt } = house;
  const parsed = dwvPlanInput.safeParse({
    ...{ floors, lowestFittingFt, highestFittingFt, ventTerminalFt, cappedVents, atticCutFt, standpipeFt },
    ...{ laundry, pipeMaterial, plugs, pipes, method },
    elevationFt: elevationFt ?? undefined,
    airPsi: method === 'air' ? (air?.minimumPsi ?? null) : null,
    rule: { acceptedMethods: accepted(rule), headRule: rule.headRule, airOnPlastic: rule.airOnPlastic },
  });
  return parsed.success ? planDwv(parsed.data) : null;
}

/**
 * What the rule card accepts, and air where it does not, since that is what is asked first on site. Under a slab (`isGroundwork`) the house's
 * fittings are not there yet, so no plan of the whole house is told.
 */
export function dwvWays(house: HouseGeometry, rule: TestRule, isGroundwork: boolean): DwvWay[] {
  const methods = accepted(rule);
  const shown = methods.includes('air') ? methods : [...methods, 'air' as const];
  return shown.map((method) => ({
    method,
    isAccepted: methods.includes(method),
    plan: isGroundwork ? null : findDwvPlan(house, method, rule),
  }));
}

function accepted({ acceptedMethods }: TestRule): DwvMethod[] {
  return dwvMethods.filter((method) => acceptedMethods.includes(method));
}

/** The house as its section is drawn. An attic is no floor there: the drawing has its own. */
export function drawnHouseOf(house: HouseGeometry): CutawayHouse {
  return { ...house, floors: house.floors.filter(({ name }) => name.trim().toLowerCase() !== 'attic') };
}

/** What the most loaded plug holds back, pounds; null where no plug is known or nothing stands on it. */
export function heaviestPlug(plan: DwvPlan | null): { name: string; forceLbf: number } | null {
  const loads = (plan?.plugs ?? []).flatMap(({ name, forceLbf }) => (forceLbf === null ? [] : [{ name, forceLbf }]));
  return loads.sort((a, b) => b.forceLbf - a.forceLbf)[0] ?? null;
}
