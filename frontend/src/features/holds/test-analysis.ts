import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { Caution, Reason } from '@holdwater/shared-types/hydraulics/findings.js';
import { analyseHold } from '@holdwater/shared-types/hydraulics/hold/analyse-hold.js';
import {
  dwvHoldInput,
  waterHoldInput,
  type DwvHoldAnalysis,
  type Expected,
  type ForecastBasis,
  type GaugeFinding,
  type HoldsThrough,
  type HoldVerdict,
  type Pair,
  type WaterHoldAnalysis,
} from '@holdwater/shared-types/hydraulics/hold.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { isPlastic, type Material } from '@holdwater/shared-types/hydraulics/materials.js';
import { isLevelTest } from './standing-tests';

export type AnalysedReading = Pick<
  Reading,
  'at' | 'receivedAt' | 'pressurePsi' | 'levelIn' | 'temperatureF' | 'gaugeValve' | 'isStruck'
>;
export type AnalysedTest = Pick<
  Hold,
  'system' | 'medium' | 'gauge' | 'tape' | 'ceilingPsi' | 'minimumPsi' | 'settleMinutes'
> & { readonly readings: readonly AnalysedReading[] };

/** The booked window and the air in the house then, as typed; null where nobody typed it. */
export interface ForecastAsked {
  readonly from: string;
  readonly to: string;
  readonly temperatureF: number | null;
  readonly coldestF: number | null;
}

/** What a test is judged by beside its own log. */
export interface TestTerms {
  /** Site above sea level, feet. */
  readonly elevationFt: number;
  /** Minutes to stand by the rule card of the visit; null: until seen. */
  readonly standMinutes: number | null;
  readonly isPlastic: boolean;
  /** Null without a booked window. */
  readonly forecast: ForecastAsked | null;
}

/** A test's log worked out; psi at a gauge, inches below the rim at a level. */
export interface TestAnalysis {
  readonly isLevel: boolean;
  readonly increment: number;
  readonly minimumPsi: number | null;
  readonly patmPsi: number;
  readonly verdict: HoldVerdict;
  readonly gaugeFinding: GaugeFinding | null;
  readonly rawDrop: number | null;
  readonly drop: Pair | null;
  readonly slopePerHour: Pair | null;
  readonly toppedUpAt: string | null;
  readonly settledAt: string | null;
  readonly series: readonly { readonly at: string; readonly value: number; readonly used: boolean }[];
  readonly forecast: {
    readonly basis: ForecastBasis;
    readonly from: Expected;
    readonly to: Expected;
    readonly holdsThrough: HoldsThrough;
    readonly topUpTo: number | null;
    readonly reasons: readonly Reason[];
  } | null;
  readonly cautions: readonly Caution[];
}

/** Where a rule card says "until seen": the quarter of an hour that the model codes ask for (IRC P2503.5.1). */
export const usualStandMinutes = 15;
/** The computation takes no more. */
const mostReadings = 500;
/** No rule card names a fall of the level it allows: how far it fell is judged by the tape alone. */
const deepestIn = 1200;

/** The test as the computation of the log sees it; null where there is nothing that could be read. */
export function analyseTest(test: AnalysedTest, terms: TestTerms): TestAnalysis | null {
  return isLevelTest(test) ? analyseLevel(test, terms) : analysePressure(test, terms);
}

/** Not struck, in the order of their instants; of two at one instant the one that came in last. */
export function countedReadings(test: Pick<AnalysedTest, 'readings'>): AnalysedReading[] {
  const byInstant = new Map<number, AnalysedReading>();
  [...test.readings]
    .filter(({ isStruck }) => !isStruck)
    .sort((a, b) => Date.parse(a.at) - Date.parse(b.at) || a.receivedAt.localeCompare(b.receivedAt))
    .forEach((reading) => byInstant.set(Date.parse(reading.at), reading));
  return [...byInstant.values()].slice(-mostReadings);
}

/** `POST /api/calc/hold` as it would be sent for this test. */
export function pressureInputOf(test: AnalysedTest, terms: TestTerms) {
  return {
    medium: test.medium,
    ...commonOf(test, terms),
    minimumPsi: test.minimumPsi ?? 0,
    ceilingPsi: test.ceilingPsi,
    gauge: { incrementPsi: test.gauge?.incrementPsi ?? 1 },
    readings: countedReadings(test).flatMap(({ at, pressurePsi, temperatureF, gaugeValve }) =>
      pressurePsi === null || gaugeValve === null ? [] : [{ at, psi: pressurePsi, temperatureF, gaugeValve }],
    ),
  };
}

function commonOf(test: AnalysedTest, { elevationFt, standMinutes, isPlastic: plastic, forecast }: TestTerms) {
  return {
    elevationFt,
    holdMinutes: standMinutes ?? usualStandMinutes,
    // only plastic goes on stretching after it was pumped up
    settleMinutes: plastic ? test.settleMinutes : 0,
    plastic,
    forecast: forecast && { ...forecast, hottestF: null },
  };
}

function analysePressure(test: AnalysedTest, terms: TestTerms): TestAnalysis | null {
  const given = pressureInputOf(test, terms);
  const input = waterHoldInput.safeParse(given);
  if (!input.success || given.readings.length === 0) return null;
  return ofPressure(analyseHold(input.data), test);
}

function ofPressure(found: WaterHoldAnalysis, test: AnalysedTest): TestAnalysis {
  const { forecast } = found;
  return {
    ...shared(found),
    isLevel: false,
    increment: found.credibleDropPsi,
    minimumPsi: test.minimumPsi,
    rawDrop: found.rawDropPsi,
    drop: found.correctedDropPsi,
    slopePerHour: found.slopePsiPerHour,
    series: found.series.map(({ at, psi, used }) => ({ at, value: psi, used })),
    forecast: forecast && { ...forecast, topUpTo: forecast.topUpToPsi },
  };
}

function analyseLevel(test: AnalysedTest, terms: TestTerms): TestAnalysis | null {
  const readings = countedReadings(test).flatMap(({ at, levelIn, temperatureF }) =>
    levelIn === null ? [] : [{ at, levelIn, temperatureF }],
  );
  const input = dwvHoldInput.safeParse({
    ...commonOf(test, terms),
    forecast: null,
    maximumFallIn: deepestIn,
    gauge: { incrementIn: test.tape?.incrementIn ?? 0.25 },
    readings,
  });
  return input.success && readings.length > 0 ? ofLevel(analyseHold(input.data)) : null;
}

function ofLevel(found: DwvHoldAnalysis): TestAnalysis {
  return {
    ...shared(found),
    isLevel: true,
    increment: found.credibleDropIn,
    minimumPsi: null,
    rawDrop: found.rawDropIn,
    drop: found.correctedDropIn,
    slopePerHour: found.slopeInPerHour,
    series: found.series.map(({ at, levelIn, used }) => ({ at, value: levelIn, used })),
    forecast: null,
  };
}

function shared({
  patmPsi,
  verdict,
  gaugeFinding,
  toppedUpAt,
  settledAt,
  cautions,
}: WaterHoldAnalysis | DwvHoldAnalysis): Pick<
  TestAnalysis,
  'patmPsi' | 'verdict' | 'gaugeFinding' | 'toppedUpAt' | 'settledAt' | 'cautions'
> {
  return { patmPsi, verdict, gaugeFinding, toppedUpAt, settledAt, cautions };
}

/** Whether the pipes of a system may stretch: yes where any is plastic, and while nobody told what they are made of. */
export function isPlasticSystem(house: HouseGeometry | null, system: System): boolean {
  const materials = house === null ? [] : materialsOf(house, system);
  return materials.length === 0 || materials.some(isPlastic);
}

function materialsOf(house: HouseGeometry, system: System): Material[] {
  if (system === 'water') return [...house.waterPipeMaterials, ...house.waterPipes.map(({ material }) => material)];
  // drain pipe by its schedule is plastic, whichever of the two it is
  const drawn = house.pipes.map(({ material }): Material => (material === 'abs-sch40' ? 'abs' : 'pvc'));
  return house.pipeMaterial === null ? drawn : [house.pipeMaterial];
}
