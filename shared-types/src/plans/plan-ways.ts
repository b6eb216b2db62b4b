import type { z } from 'zod';
import type { TestRule } from '../departments/rule-card.content.js';
import { dwvMethods, media, type DwvMethod, type Medium } from '../holds/hold.states.js';
import { dwvPlanInput, type DwvPlanGiven } from '../hydraulics/dwv-plan.contract.js';
import { planDwv } from '../hydraulics/dwv-plan.js';
import { volumeBelowGal } from '../hydraulics/dwv-volume.js';
import { reasonOf, when, type Reason } from '../hydraulics/findings.js';
import type { HouseGeometry } from '../hydraulics/house-geometry.js';
import { mayHoldAir } from '../hydraulics/materials.js';
import { waterPlanInput } from '../hydraulics/water-plan.contract.js';
import { planWater } from '../hydraulics/water-plan.js';
import { groundworkHouse, standpipeEndFt } from './groundwork-house.js';
import type { PlanTools } from './plan-tools.js';
import type { PlanWay } from './plan.contract.js';

/** What the ways of one unit, stage and system are worked out from. */
export interface WaysInput {
  readonly house: HouseGeometry;
  readonly rule: TestRule;
  /** The stage lets a slab be poured: nothing above it stands yet. */
  readonly isGroundwork: boolean;
  readonly tools: PlanTools;
  /** The department's, for a house that names none. */
  readonly elevationFt: number;
}

/**
 * Every way there is to put the system under test, each with its whole plan, and of those that do not serve why: in reason codes, or by the
 * measures of the house that are missing. Pure; throws nothing.
 */
export function planWays(input: WaysInput): PlanWay[] {
  if (input.rule.system === 'water') return media.map((medium) => waterWay(input, medium));
  return dwvMethods.map((method) => dwvWay(input, method));
}

function dwvWay(input: WaysInput, method: DwvMethod): PlanWay {
  const { rule } = input;
  const medium = method === 'air' ? 'air' : 'water';
  const isAccepted = rule.acceptedMethods.includes(method);
  const hasNoPressure = isAccepted && method === 'air' && airMinimumPsi(rule) === null;
  const parsed = dwvPlanInput.safeParse(dwvFields(input, method));
  const absent = absentEnds(input);
  const dwv = parsed.success && absent.length === 0 ? planDwv(parsed.data) : null;
  const reasons = [
    ...(dwv?.reasons ?? plainReasons(input, method)),
    ...when(hasNoPressure, () => reasonOf('medium-not-accepted', { medium })),
  ];
  // of a way the card refuses no measure is asked for
  const missing = isAccepted ? [...absent, ...missingOf(parsed)] : [];
  return wayOf({ method, medium, isAccepted, reasons, missing, dwv, water: null });
}

/** The ends of the system, which every way needs. */
function absentEnds({ house, isGroundwork }: WaysInput): PlanWay['missing'] {
  const there = isGroundwork ? groundworkHouse(house) : house;
  const ends = ['lowestFittingFt', 'highestFittingFt'] as const;
  return ends.filter((field) => there[field] === null).map((field) => ({ field, code: 'required' }));
}

/** What speaks against a way even where it cannot be worked out. */
function plainReasons({ rule, house, tools }: WaysInput, method: DwvMethod): Reason[] {
  const { pipeMaterial } = house;
  const allowed = { airOnPlastic: rule.airOnPlastic, makersAllowAir: tools.makersAllowAir };
  const isBarred = method === 'air' && pipeMaterial !== null && !mayHoldAir(pipeMaterial, allowed);
  return [
    ...when(!rule.acceptedMethods.includes(method), () => reasonOf('method-not-accepted', { method })),
    ...when(isBarred, () => reasonOf('air-on-plastic', { material: pipeMaterial ?? '' })),
  ];
}

function dwvFields({ house, rule, isGroundwork, tools, elevationFt }: WaysInput, method: DwvMethod): DwvPlanGiven {
  const there = isGroundwork ? groundworkHouse(house) : house;
  const feet = rule.headRule?.feet ?? 0;
  const isStandpipe = isGroundwork && method === 'standpipe';
  const methods = dwvMethods.filter((each) => rule.acceptedMethods.includes(each));
  const { floors, highestFittingFt, lowestFittingFt, cappedVents, atticCutFt, standpipeFt, laundry } = there;
  const wholeGal = volumeBelowGal(there.pipes, Infinity);
  return {
    ...{ floors, cappedVents, atticCutFt, standpipeFt, laundry, method },
    // stand-ins for what nobody measured, so that everything else that is missing is told at once; no plan is made with them
    lowestFittingFt: lowestFittingFt ?? highestFittingFt ?? there.ventTerminalFt ?? 0,
    highestFittingFt: highestFittingFt ?? Math.max(lowestFittingFt ?? 0, there.ventTerminalFt ?? 0),
    ventTerminalFt: isStandpipe ? standpipeEndFt(there, feet) : there.ventTerminalFt,
    ...{ pipeMaterial: there.pipeMaterial, pipes: there.pipes, plugs: tools.plugs ?? there.plugs },
    ...{ riserIn: tools.riserIn, maxSectionFt: tools.maxSectionFt, fillRateGpm: tools.fillRateGpm },
    ...{ waterTempF: tools.waterTempF, makersAllowAir: tools.makersAllowAir },
    airPsi: airMinimumPsi(rule) ?? tools.airPsi,
    airVolumeGal: tools.airVolumeGal ?? (wholeGal > 0 ? wholeGal : null),
    elevationFt: there.elevationFt ?? elevationFt,
    rule: {
      acceptedMethods: methods,
      headRule: rule.headRule,
      airOnPlastic: rule.airOnPlastic,
    } as DwvPlanGiven['rule'],
  };
}

const airMinimumPsi = (rule: TestRule): number | null =>
  rule.pressures.find(({ medium }) => medium === 'air')?.minimumPsi ?? null;

function waterWay({ house, rule, tools, elevationFt }: WaysInput, medium: Medium): PlanWay {
  const pressure = rule.pressures.find((each) => each.medium === medium);
  const isMethodAccepted = rule.acceptedMethods.includes('gauge');
  const base = { method: 'gauge' as const, medium, dwv: null };
  const notAccepted = when(!isMethodAccepted, () => reasonOf('method-not-accepted', { method: 'gauge' }));
  if (pressure === undefined) {
    const reasons = [...notAccepted, reasonOf('medium-not-accepted', { medium })];
    return wayOf({ ...base, isAccepted: false, reasons, missing: [], water: null });
  }
  const parsed = waterPlanInput.safeParse({
    ...{ gaugeFt: house.gaugeFt, highestOutletFt: house.highestOutletFt, floors: house.floors, medium },
    ...{ lowestFittingFt: house.waterLowestFittingFt, pipeMaterials: house.waterPipeMaterials },
    ...{ lowestRatedPsi: house.lowestRatedPsi, lowestRatedAirPsi: house.lowestRatedAirPsi, supplyPsi: house.supplyPsi },
    ...{ makersAllowAir: tools.makersAllowAir, airVolumeGal: tools.airVolumeGal, gauge: tools.gauge },
    ...{ waterTempF: tools.waterTempF, elevationFt: house.elevationFt ?? elevationFt },
    rule: {
      ...{ minimumPsi: pressure.minimumPsi, preferredPsi: pressure.preferredPsi, measuredAt: rule.measuredAt },
      ...{ media: rule.pressures.map((each) => each.medium), airOnPlastic: rule.airOnPlastic },
      gaugeIncrements: rule.gaugeIncrements,
    },
  });
  const water = parsed.success ? planWater(parsed.data) : null;
  const reasons: Reason[] = [...notAccepted, ...(water?.reasons ?? [])];
  const missing = missingOf(parsed).map(({ field, code }) => ({ field: namedByHouse[field] ?? field, code }));
  return wayOf({ ...base, isAccepted: isMethodAccepted, reasons, missing, water });
}

/** What the house calls a field of the water plan. */
const namedByHouse: Readonly<Record<string, string>> = {
  lowestFittingFt: 'waterLowestFittingFt',
  pipeMaterials: 'waterPipeMaterials',
};

const wayOf = (way: Omit<PlanWay, 'isOffered'>): PlanWay => ({
  ...way,
  isOffered: way.isAccepted && way.reasons.length === 0 && way.missing.length === 0,
});

/** The fields that keep a plan from being worked out, each with its code; a field once. */
function missingOf(parsed: z.ZodSafeParseResult<unknown>): PlanWay['missing'] {
  if (parsed.success) return [];
  const found = new Map<string, string>();
  for (const { path, message, code } of parsed.error.issues) {
    const field = path.join('.');
    // a measure nobody took is null, which is no number
    const isAbsent = code === 'invalid_type' && message === 'must-be-a-number';
    if (!found.has(field)) found.set(field, isAbsent ? 'required' : message);
  }
  return [...found].map(([field, why]) => ({ field, code: why }));
}
