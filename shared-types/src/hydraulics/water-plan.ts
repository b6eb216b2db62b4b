import { atmospherePsi, storedEnergyFtLbf } from './air.js';
import { waterPlanCautions } from './cautions.js';
import { floorsTopDown } from './dwv-head.js';
import { requiredIncrementPsi } from './gauge-rule.js';
import { waterTakeDown } from './take-down.js';
import { isAbove, isBelow, roundDownTo, roundUpTo } from './tolerance.js';
import { headPsi } from './water.js';
import type { WaterPlan, WaterPlanInput } from './water-plan.contract.js';
import { waterReasons } from './water-reasons.js';

/**
 * The plan of a water test: the least the gauge must show, what to pump to, the most the lowest-rated part bears, and the pressure on every
 * floor at the target. Takes input that `waterPlanInput` has parsed; throws nothing. Gauge psi, feet.
 */
export function planWater(input: WaterPlanInput): WaterPlan {
  const head = (feet: number): number => (input.medium === 'air' ? 0 : headPsi(feet, input.waterTempF));
  const floorPsi = floorPsiOf(input, head);
  const ceilingPsi = roundDownTo(
    input.gauge.incrementPsi,
    ratedPsiOf(input) - head(input.gaugeFt - input.lowestFittingFt),
  );
  const targetPsi = targetPsiOf(input, floorPsi, ceilingPsi);
  const neededIncrementPsi = requiredIncrementPsi(floorPsi, input.rule.gaugeIncrements);
  const reasons = waterReasons(input, { floorPsi, targetPsi, ceilingPsi, requiredIncrementPsi: neededIncrementPsi });
  const needsTopUp = input.supplyPsi === null ? null : isBelow(input.supplyPsi, targetPsi);
  const energyFtLbf = energyOf(input, targetPsi);
  return {
    floorPsi,
    targetPsi,
    ceilingPsi,
    usable: reasons.length === 0,
    reasons,
    needsTopUp,
    requiredIncrementPsi: neededIncrementPsi,
    storedEnergyFtLbf: energyFtLbf,
    levels: levelsOf(input, targetPsi, head),
    takeDown: waterTakeDown(input.medium),
    cautions: waterPlanCautions({ medium: input.medium, targetPsi, needsTopUp, storedEnergyFtLbf: energyFtLbf }),
  };
}

type Head = (feet: number) => number;

/** The least at the gauge; measured at the highest outlet, the column up to it comes on top. */
function floorPsiOf({ rule, highestOutletFt, gaugeFt }: WaterPlanInput, head: Head): number {
  return rule.minimumPsi + (rule.measuredAt === 'highest-outlet' ? head(highestOutletFt - gaugeFt) : 0);
}

/** What the weakest part bears; a rating for air counts only where air comes in. */
function ratedPsiOf({ medium, lowestRatedPsi, lowestRatedAirPsi }: WaterPlanInput): number {
  return medium === 'water' ? lowestRatedPsi : Math.min(lowestRatedPsi, lowestRatedAirPsi ?? Infinity);
}

/** The preferred pressure where the weakest part bears it; else its ceiling, as long as that still satisfies the rule. */
function targetPsiOf({ rule, gauge }: WaterPlanInput, floorPsi: number, ceilingPsi: number): number {
  const wantedPsi = roundUpTo(gauge.incrementPsi, Math.max(floorPsi, rule.preferredPsi ?? 0));
  const leastPsi = roundUpTo(gauge.incrementPsi, floorPsi);
  return isAbove(wantedPsi, ceilingPsi) && !isAbove(leastPsi, ceilingPsi) ? ceilingPsi : wantedPsi;
}

function energyOf({ medium, airVolumeGal, elevationFt }: WaterPlanInput, targetPsi: number): number | null {
  if (medium === 'water' || airVolumeGal === null) return null;
  return storedEnergyFtLbf(targetPsi, airVolumeGal, atmospherePsi(elevationFt));
}

function levelsOf(input: WaterPlanInput, targetPsi: number, head: Head): WaterPlan['levels'] {
  const points = [
    ...floorsTopDown(input.floors),
    { name: 'highest outlet', elevationFt: input.highestOutletFt },
    { name: 'lowest fitting', elevationFt: input.lowestFittingFt },
  ];
  return points.map(({ name, elevationFt }) => {
    const belowGaugeFt = input.gaugeFt - elevationFt;
    return { name, elevationFt, pressurePsi: targetPsi + head(belowGaugeFt) - head(-belowGaugeFt) };
  });
}
