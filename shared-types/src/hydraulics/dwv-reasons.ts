import type { DwvPlanInput, PlugLoad } from './dwv-plan.contract.js';
import { isLaundryOnLowestFloor } from './dwv-fill-level.js';
import { reasonOf, when, type Reason } from './findings.js';
import { mayHoldAir } from './materials.js';
import { isAbove } from './tolerance.js';

/** Everything that keeps the plan from being used, each with its numbers. */
export function dwvReasons(input: DwvPlanInput, shortByFt: number | null, loads: readonly PlugLoad[]): Reason[] {
  const { method, rule, pipeMaterial, makersAllowAir } = input;
  return [
    ...when(!rule.acceptedMethods.includes(method), () => reasonOf('method-not-accepted', { method })),
    ...laundryReasons(input),
    ...when(shortByFt !== null && isAbove(shortByFt, 0), () => reasonOf('level-short', { shortByFt: shortByFt ?? 0 })),
    ...loads.flatMap((load) => when(isAbove(load.loadFraction, 1), () => overloaded(load))),
    ...when(
      method === 'air' &&
        pipeMaterial !== null &&
        !mayHoldAir(pipeMaterial, { airOnPlastic: rule.airOnPlastic, makersAllowAir }),
      () => reasonOf('air-on-plastic', { material: pipeMaterial ?? '' }),
    ),
  ];
}

const overloaded = ({ name, pressurePsi, ratedPsi, loadFraction }: PlugLoad): Reason =>
  reasonOf('plug-overloaded', { name, pressurePsi, ratedPsi, loadFraction });

/** A box stands for a laundry upstairs, a riser for one on the lowest floor. */
function laundryReasons({ method, laundry, floors }: DwvPlanInput): Reason[] {
  if (laundry === null) return [];
  const isLowest = isLaundryOnLowestFloor(laundry, floors);
  if (method === 'laundry-box' && isLowest) return [reasonOf('laundry-on-lowest-floor', { floor: laundry.floor })];
  if (method === 'laundry-riser' && !isLowest)
    return [reasonOf('laundry-not-on-lowest-floor', { floor: laundry.floor })];
  return [];
}
