import { storedEnergyFtLbf, atmospherePsi } from './air.js';
import { dwvPlanCautions } from './cautions.js';
import { ownFillLevelFt } from './dwv-fill-level.js';
import { levelsOf, plugLoadsOf, type LoadAt } from './dwv-head.js';
import { defaultOverlapFt, headInLiftsFt, liftsOf, type Lift } from './dwv-lifts.js';
import type { DwvPlan, DwvPlanInput } from './dwv-plan.contract.js';
import { dwvReasons } from './dwv-reasons.js';
import { volumeBelowGal } from './dwv-volume.js';
import { dwvTakeDown } from './take-down.js';
import { isAbove } from './tolerance.js';
import { headPsi, waterWeightLb } from './water.js';

/**
 * The plan of a DWV test: where the water has to stand, where the method fills to, what then stands on every floor and plug, how much water
 * it takes, and what it leaves to be put back. Takes input that `dwvPlanInput` has parsed; throws nothing. Feet, psi, gallons, pounds.
 */
export function planDwv(input: DwvPlanInput): DwvPlan {
  const fillLevelFt = ownFillLevelFt(input);
  const requiredLevelFt = requiredFt(input, fillLevelFt);
  const shortByFt =
    fillLevelFt === null || requiredLevelFt === null ? null : Math.max(0, requiredLevelFt - fillLevelFt);
  const lifts = liftsFor(input);
  const loadAt = loadFor(input, fillLevelFt, lifts);
  const plugs = plugLoadsOf(input.plugs, loadAt);
  const reasons = dwvReasons(input, shortByFt, plugs);
  const volume = volumeFor(input, fillLevelFt);
  const air = airFor(input);
  return {
    fillLevelFt,
    requiredLevelFt,
    shortByFt,
    usable: reasons.length === 0,
    reasons,
    levels: levelsOf(input, loadAt),
    notUnderTest: notUnderTest(input, fillLevelFt),
    plugs,
    ...volume,
    lifts,
    air,
    takeDown: dwvTakeDown(input.method, input.cappedVents, input.plugs.length),
    cautions: dwvPlanCautions({ ...input, fillLevelFt, loads: plugs, volumeGal: volume.volumeGal, air }),
  };
}

/** The level the rule asks for: so many feet over the highest fitting or to the vent terminal; else the method's own. None with air. */
function requiredFt(
  { method, rule, highestFittingFt, ventTerminalFt }: DwvPlanInput,
  ownFt: number | null,
): number | null {
  if (method === 'air' || method === 'sectional' || rule.headRule?.kind !== 'above-highest-fitting') return ownFt;
  return Math.min(ventTerminalFt ?? Infinity, highestFittingFt + rule.headRule.feet);
}

function liftsFor({ method, lowestFittingFt, ventTerminalFt, maxSectionFt, rule }: DwvPlanInput): Lift[] | null {
  if (method !== 'sectional' || ventTerminalFt === null || maxSectionFt === null) return null;
  return liftsOf(lowestFittingFt, ventTerminalFt, maxSectionFt, rule.headRule?.feet ?? defaultOverlapFt);
}

function loadFor(
  { airPsi, waterTempF }: DwvPlanInput,
  fillLevelFt: number | null,
  lifts: readonly Lift[] | null,
): LoadAt {
  if (fillLevelFt === null) return () => ({ headFt: null, pressurePsi: airPsi ?? 0 });
  return (elevationFt) => {
    const headFt = lifts ? headInLiftsFt(elevationFt, lifts) : Math.max(0, fillLevelFt - elevationFt);
    return { headFt, pressurePsi: headPsi(headFt, waterTempF) };
  };
}

function notUnderTest({ method, ventTerminalFt }: DwvPlanInput, fillLevelFt: number | null): DwvPlan['notUnderTest'] {
  if (method === 'sectional' || fillLevelFt === null || ventTerminalFt === null) return [];
  return isAbove(ventTerminalFt, fillLevelFt) ? [{ fromFt: fillLevelFt, toFt: ventTerminalFt }] : [];
}

function volumeFor(
  input: DwvPlanInput,
  fillLevelFt: number | null,
): Pick<DwvPlan, 'volumeGal' | 'weightLb' | 'fillMinutes'> {
  if (fillLevelFt === null) return { volumeGal: null, weightLb: null, fillMinutes: null };
  const volumeGal = volumeBelowGal(input.pipes, fillLevelFt);
  const fillMinutes = input.fillRateGpm === null ? null : volumeGal / input.fillRateGpm;
  return { volumeGal, weightLb: waterWeightLb(volumeGal, input.waterTempF), fillMinutes };
}

function airFor({ method, airPsi, airVolumeGal, elevationFt }: DwvPlanInput): DwvPlan['air'] {
  if (method !== 'air' || airPsi === null) return null;
  return { pressurePsi: airPsi, energyFtLbf: storedEnergyFtLbf(airPsi, airVolumeGal ?? 0, atmospherePsi(elevationFt)) };
}
