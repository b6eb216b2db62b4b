import { airEnergyFtLbf, columnPsi, downTo, isAbove, upTo } from './physics.js';
import type { IncrementRow, WaterRequest } from './water.input.js';

/** The answer to a water plan, as the design's section 3 has it, computed a second time. */
export function secondWaterPlan(given: WaterRequest) {
  const { rule, gauge, medium } = given;
  const hasAir = medium !== 'water';
  const head = (feet: number) => (medium === 'air' ? 0 : columnPsi(feet, given.waterTempF ?? 60));
  const isAtOutlet = rule.measuredAt === 'highest-outlet';
  const floorPsi = rule.minimumPsi + (isAtOutlet ? head(given.highestOutletFt - given.gaugeFt) : 0);
  const ratedForAir = hasAir ? (given.lowestRatedAirPsi ?? Infinity) : Infinity;
  const ratedPsi = Math.min(given.lowestRatedPsi, ratedForAir);
  const ceilingPsi = downTo(ratedPsi - head(given.gaugeFt - given.lowestFittingFt), gauge.incrementPsi);
  const leastPsi = upTo(floorPsi, gauge.incrementPsi);
  const wishedPsi = upTo(Math.max(floorPsi, rule.preferredPsi ?? floorPsi), gauge.incrementPsi);
  const isCapped = isAbove(wishedPsi, ceilingPsi) && !isAbove(leastPsi, ceilingPsi);
  const targetPsi = isCapped ? ceilingPsi : wishedPsi;
  const requiredIncrementPsi = incrementFor(floorPsi, rule.gaugeIncrements);
  const reasons: string[] = [];
  if (!rule.media.includes(medium)) reasons.push('medium-not-accepted');
  if (hasAir && isAirBarred(given)) reasons.push('air-on-plastic');
  if (isAbove(leastPsi, ceilingPsi)) reasons.push('above-rated-part');
  if (isAbove(gauge.incrementPsi, requiredIncrementPsi)) reasons.push('gauge-too-coarse');
  if (isAbove(targetPsi, gauge.rangePsi)) reasons.push('gauge-range');
  const energy = () => airEnergyFtLbf(targetPsi, given.airVolumeGal ?? Number.NaN, given.elevationFt ?? 0);
  const atElevation = (feet: number) => targetPsi + head(given.gaugeFt - feet) - head(feet - given.gaugeFt);
  const places: [string, number][] = [
    ...(given.floors ?? []).map(({ name, elevationFt }): [string, number] => [name, elevationFt]),
    ['highest outlet', given.highestOutletFt],
    ['lowest fitting', given.lowestFittingFt],
  ];
  return {
    floorPsi,
    targetPsi,
    ceilingPsi,
    usable: reasons.length === 0,
    reasons,
    needsTopUp: given.supplyPsi == null ? null : isAbove(targetPsi, given.supplyPsi),
    requiredIncrementPsi,
    storedEnergyFtLbf: hasAir && given.airVolumeGal != null ? energy() : null,
    levels: places.map(([name, feet]) => ({ name, pressurePsi: atElevation(feet) })),
    takeDown: ['remove-gauge-and-hose', 'open-isolated', 'flush', ...(hasAir ? ['release-air'] : [])],
  };
}

/** The model codes' table (IRC P2503.9, as check-values.md names it) unless the rule brings its own. */
function incrementFor(floorPsi: number, given: IncrementRow[] | null | undefined): number {
  const rows = given ?? [{ upToPsi: 10, incrementPsi: 0.1 }, { upToPsi: 100, incrementPsi: 1 }, { percent: 2 }];
  const fitting = rows.find((row) => 'percent' in row || !isAbove(floorPsi, row.upToPsi)) ?? rows.at(-1);
  if (!fitting) throw new Error('an empty table of increments');
  return 'percent' in fitting ? (floorPsi * fitting.percent) / 100 : fitting.incrementPsi;
}

function isAirBarred({ pipeMaterials, rule, makersAllowAir }: WaterRequest): boolean {
  if (pipeMaterials.some((material) => ['pvc', 'abs', 'cpvc'].includes(material))) return true;
  return pipeMaterials.includes('pex') && !(rule.airOnPlastic === true && makersAllowAir === true);
}

/** What the table of cautions pins for a water plan: codes that must be there (true) or must not (false). */
export function waterCautions(given: WaterRequest, plan: { needsTopUp: boolean | null }): Record<string, boolean> {
  const rules: Record<string, boolean> = {
    'local-code': true,
    'under-pressure': true,
    'compressed-air': given.medium !== 'water',
    discharge: false,
    'plug-load': false,
    'plug-stand-aside': false,
    'floors-not-under-test': false,
    attic: false,
    roof: false,
    trench: false,
    'shut-gauge': false,
    'one-reading': false,
    'many-top-ups': false,
    'temperature-missing': false,
  };
  // without water in the line the table's words on filling and on the meter valve can be read either way
  if (given.medium === 'air') return rules;
  const wet = { ...rules, backflow: true, 'potable-only': true, 'relief-valve': true };
  // whether a pump is needed is not known without the street's pressure: warned or not, the text allows both
  return plan.needsTopUp === null ? wet : { ...wet, 'close-the-main': plan.needsTopUp };
}
