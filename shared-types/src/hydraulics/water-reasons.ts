import { reasonOf, when, type Reason } from './findings.js';
import { mayHoldAirInWaterLine } from './materials.js';
import { isAbove, isBelow, roundUpTo } from './tolerance.js';
import type { WaterPlan, WaterPlanInput } from './water-plan.contract.js';

type Numbers = Pick<WaterPlan, 'floorPsi' | 'targetPsi' | 'ceilingPsi' | 'requiredIncrementPsi'>;

/** Everything that keeps a water plan from being used, each with its numbers. */
export function waterReasons(input: WaterPlanInput, numbers: Numbers): Reason[] {
  const { gauge, medium, rule, makersAllowAir } = input;
  const { floorPsi, targetPsi, ceilingPsi } = numbers;
  const leastPsi = roundUpTo(gauge.incrementPsi, floorPsi);
  const barred = input.pipeMaterials.filter(
    (material) => !mayHoldAirInWaterLine(material, { airOnPlastic: rule.airOnPlastic, makersAllowAir }),
  );
  return [
    ...when(!rule.media.includes(medium), () => reasonOf('medium-not-accepted', { medium })),
    ...when(medium !== 'water' && barred.length > 0, () => reasonOf('air-on-plastic', { materials: barred })),
    ...when(isAbove(leastPsi, ceilingPsi), () => reasonOf('above-rated-part', { floorPsi: leastPsi, ceilingPsi })),
    ...when(isAbove(gauge.incrementPsi, numbers.requiredIncrementPsi), () =>
      reasonOf('gauge-too-coarse', {
        incrementPsi: gauge.incrementPsi,
        requiredIncrementPsi: numbers.requiredIncrementPsi,
      }),
    ),
    ...when(isBelow(gauge.rangePsi, targetPsi), () => reasonOf('gauge-range', { rangePsi: gauge.rangePsi, targetPsi })),
  ];
}
