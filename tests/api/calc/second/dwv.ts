import type { DwvRequest } from './dwv.input.js';
import { dwvLevelOf, liftsOf, type Lift } from './dwv-level.js';
import {
  airEnergyFtLbf,
  boreIn2,
  columnPsi,
  cubicInchesPerGallon,
  densityOfWater,
  gallonsPerFoot,
  isAbove,
  kilogramsPerPound,
  metersPerInch,
} from './physics.js';

/** The answer to a DWV plan, field for field as the design's section 2 has it, computed a second time. */
export function secondDwvPlan(given: DwvRequest) {
  const level = dwvLevelOf(given);
  const lifts = given.method === 'sectional' ? liftsOf(given) : null;
  const pressAt = pressureBy(given, level.fill, lifts);
  const plugs = (given.plugs ?? []).map(({ name, elevationFt, ratedPsi, nominalIn }) => {
    const { pressurePsi } = pressAt(elevationFt);
    const forceLbf = nominalIn == null ? null : pressurePsi * boreIn2(nominalIn);
    return { name, pressurePsi, loadFraction: pressurePsi / ratedPsi, forceLbf };
  });
  const shortByFt = level.fill === null || level.required === null ? null : Math.max(0, level.required - level.fill);
  const reasons = reasonsOf(given, shortByFt, plugs);
  const vent = given.ventTerminalFt;
  const isWhole = level.fill === null || lifts !== null || !isAbove(vent, level.fill);
  const volumeGal = level.fill === null ? null : volumeUpTo(given, level.fill);
  return {
    fillLevelFt: level.fill,
    requiredLevelFt: level.required,
    shortByFt,
    usable: reasons.length === 0,
    reasons,
    levels: placesOf(given).map(([name, elevationFt]) => ({ name, elevationFt, ...pressAt(elevationFt) })),
    notUnderTest: isWhole ? [] : [{ fromFt: level.fill, toFt: vent }],
    plugs,
    volumeGal,
    weightLb: volumeGal === null ? null : weightOf(volumeGal, given.waterTempF ?? 60),
    fillMinutes: volumeGal === null || given.fillRateGpm == null ? null : volumeGal / given.fillRateGpm,
    lifts,
    air: airOf(given),
    takeDown: takeDownOf(given),
  };
}

/** Floors top down, the two fittings, then each plug. */
function placesOf(given: DwvRequest): [string, number][] {
  const floors = [...(given.floors ?? [])].sort((a, b) => b.elevationFt - a.elevationFt);
  return [
    ...floors.map(({ name, elevationFt }): [string, number] => [name, elevationFt]),
    ['highest fitting', given.highestFittingFt],
    ['lowest fitting', given.lowestFittingFt],
    ...(given.plugs ?? []).map(({ name, elevationFt }): [string, number] => [name, elevationFt]),
  ];
}

function pressureBy(given: DwvRequest, fill: number | null, lifts: Lift[] | null) {
  const wet = (headFt: number) => ({ headFt, pressurePsi: columnPsi(headFt, given.waterTempF ?? 60) });
  return (elevationFt: number): { headFt: number | null; pressurePsi: number } => {
    if (fill === null) return { headFt: null, pressurePsi: given.airPsi ?? Number.NaN };
    if (lifts === null) return wet(Math.max(0, fill - elevationFt));
    const first = lifts[0];
    if (first && elevationFt < first.fromFt) return wet(Math.max(0, first.toFt - elevationFt));
    const here = lifts.filter(({ fromFt, toFt }) => !isAbove(fromFt, elevationFt) && !isAbove(elevationFt, toFt));
    return wet(Math.max(0, ...here.map(({ toFt }) => toFt - elevationFt)));
  };
}

function reasonsOf(given: DwvRequest, shortByFt: number | null, plugs: { name: string; loadFraction: number }[]) {
  const { method, rule } = given;
  const reasons: { code: string; about: string | number | null }[] = [];
  const say = (code: string, about: string | number | null = null) => reasons.push({ code, about });
  if (!rule.acceptedMethods.includes(method)) say('method-not-accepted');
  const lowest = Math.min(...(given.floors ?? []).map(({ elevationFt }) => elevationFt));
  const isLowest = given.floors?.find(({ name }) => name === given.laundry?.floor)?.elevationFt === lowest;
  if (method === 'laundry-riser' && !isLowest) say('laundry-not-on-lowest-floor');
  if (method === 'laundry-box' && isLowest) say('laundry-on-lowest-floor');
  if (shortByFt !== null && isAbove(shortByFt, 0)) say('level-short', shortByFt);
  for (const { name, loadFraction } of plugs) if (isAbove(loadFraction, 1)) say('plug-overloaded', name);
  const isPlastic = ['pvc', 'abs', 'cpvc', 'pex'].includes(given.pipeMaterial);
  const isAllowed = rule.airOnPlastic === true && given.makersAllowAir === true;
  if (method === 'air' && isPlastic && !isAllowed) say('air-on-plastic');
  return reasons;
}

function volumeUpTo(given: DwvRequest, fill: number): number {
  let gallons = 0;
  for (const { nominalIn, bottomFt, topFt, lengthFt } of given.pipes ?? []) {
    const span = topFt - bottomFt;
    const isWhole = !isAbove(topFt, fill);
    const share = isWhole ? 1 : span === 0 ? 0 : Math.max(0, (fill - bottomFt) / span);
    gallons += lengthFt * share * gallonsPerFoot(nominalIn);
  }
  return gallons;
}

function weightOf(gallons: number, temperatureF: number): number {
  const cubicMeters = gallons * cubicInchesPerGallon * metersPerInch ** 3;
  return (cubicMeters * densityOfWater(temperatureF)) / kilogramsPerPound;
}

function airOf(given: DwvRequest) {
  if (given.method !== 'air' || given.airPsi == null || given.airVolumeGal == null) return null;
  const energyFtLbf = airEnergyFtLbf(given.airPsi, given.airVolumeGal, given.elevationFt ?? 0);
  return { pressurePsi: given.airPsi, energyFtLbf };
}

function takeDownOf(given: DwvRequest): string[] {
  const byMethod: Record<DwvRequest['method'], string[]> = {
    'stack-to-roof': [],
    'attic-cut': ['rejoin-vent-cut'],
    'laundry-riser': ['remove-laundry-riser', 'close-branch'],
    'laundry-box': ['close-box-knockout'],
    standpipe: ['cut-standpipe-and-cap'],
    sectional: ['cap-test-tees'],
    air: ['release-air'],
  };
  const codes = [...byMethod[given.method], 'remove-caps', 'clear-traps'];
  if ((given.cappedVents ?? 0) > 0) codes.push('uncap-vents');
  if ((given.plugs ?? []).length > 0) codes.push('remove-test-plugs');
  return codes;
}
