import {
  takeDownGroups,
  takeDownItems,
  type TakeDownGroup,
  type TakeDownItem,
} from '@holdwater/shared-types/clearances/take-down.js';
import type { Medium, Method } from '@holdwater/shared-types/holds/hold.states.js';
import type { Caution, CautionCode } from '@holdwater/shared-types/hydraulics/findings.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { PlanTools } from '@holdwater/shared-types/plans/plan-tools.js';
import type { PlanWay, TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';

/** What the page draws: a way just worked out, or the plan as it was told when it was chosen. */
export interface ShownPlan {
  readonly way: PlanWay;
  readonly house: HouseGeometry;
  readonly tools: PlanTools;
  readonly isGroundwork: boolean;
  /** Null while it is a preview. */
  readonly chosen: TestPlan | null;
}

/** A way by its method and medium, as the page names it. */
export const wayKey = ({ method, medium }: { method: Method; medium: Medium }): string => `${method} ${medium}`;

/** The plan that was chosen, as a way: it was offered then, whatever holds now. */
export function wayOfPlan({ method, medium, dwv, water }: TestPlan): PlanWay {
  return { method, medium, dwv, water, isAccepted: true, isOffered: true, reasons: [], missing: [] };
}

/** The way to show first: the chosen one, else the first that serves, else the first there is. */
export function firstWay(ways: readonly PlanWay[], current: TestPlan | null): string | null {
  if (current !== null) return wayKey(current);
  const way = ways.find(({ isOffered }) => isOffered) ?? ways[0];
  return way === undefined ? null : wayKey(way);
}

/** What a plan leaves to put back, by group; groups with nothing are left out. */
export function takeDownByGroup(items: readonly TakeDownItem[]): { group: TakeDownGroup; items: TakeDownItem[] }[] {
  return takeDownGroups
    .map((group) => ({ group, items: items.filter((item) => takeDownItems[item] === group) }))
    .filter((each) => each.items.length > 0);
}

/** What the numbers of a plan are about; a caution stands beside the number it concerns. */
export type CautionPlace = 'level' | 'plugs' | 'filling' | 'pressure';

const placeOf: Readonly<Partial<Record<CautionCode, CautionPlace>>> = {
  'floors-not-under-test': 'level',
  attic: 'level',
  roof: 'level',
  ladder: 'level',
  trench: 'level',
  'plug-load': 'plugs',
  'plug-stand-aside': 'plugs',
  discharge: 'filling',
  backflow: 'filling',
  'potable-only': 'filling',
  'relief-valve': 'filling',
};

/** The cautions of a place; what is placed nowhere else stands by the pressure. `local-code` closes every plan and stands nowhere. */
export function cautionsAt(cautions: readonly Caution[], place: CautionPlace): Caution[] {
  return cautions.filter(({ code }) => code !== 'local-code' && (placeOf[code] ?? 'pressure') === place);
}
