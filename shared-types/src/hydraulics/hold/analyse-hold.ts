import type {
  DwvHoldAnalysis,
  DwvHoldInput,
  Expected,
  HoldAnalysis,
  HoldInput,
  Pair,
  WaterHoldAnalysis,
  WaterHoldInput,
} from '../hold.contract.js';
import { dwvLog, flip, waterLog, type HoldLog } from './hold-log.js';
import { instantOf, instantOrNull } from './instant-of.js';
import { pairOf, studyOf, type Study } from './study.js';

export function analyseHold(input: WaterHoldInput): WaterHoldAnalysis;
export function analyseHold(input: DwvHoldInput): DwvHoldAnalysis;
export function analyseHold(input: HoldInput): HoldAnalysis;
/**
 * What a test's log says of the system, and whether it will stand for the window: psi for a water test, inches below the rim for a DWV test
 * (no medium). Takes input that `holdInput` has parsed; throws nothing.
 */
export function analyseHold(input: HoldInput): HoldAnalysis {
  return isWaterHold(input) ? analyseWater(input) : analyseDwv(input);
}

const isWaterHold = (input: HoldInput): input is WaterHoldInput => input.medium !== null && input.medium !== undefined;

function analyseWater(input: WaterHoldInput): WaterHoldAnalysis {
  const log = waterLog(input);
  const study = studyOf(log);
  const { drops, trend, forecast } = study;
  return {
    ...commonOf(log, study),
    credibleDropPsi: log.increment,
    rawDropPsi: drops && drops.raw,
    correctedDropPsi: drops && pairOf(drops.corrected),
    slopePsiPerHour: trend && pairOf(trend.slopes),
    marginPsiPerHour: trend && trend.margin,
    series: study.series.map(({ reading, corrected, isUsed }) => ({
      at: instantOf(reading.atMs),
      psi: reading.value,
      correctedPsi: corrected,
      used: isUsed,
    })),
    forecast: forecast && { ...forecastPart(forecast, forecast), topUpToPsi: forecast.topUpTo },
  };
}

function analyseDwv(input: DwvHoldInput): DwvHoldAnalysis {
  const log = dwvLog(input);
  const study = studyOf(log);
  const { drops, trend, forecast } = study;
  return {
    ...commonOf(log, study),
    credibleDropIn: log.increment,
    rawDropIn: drops && drops.raw,
    correctedDropIn: drops && pairOf(drops.corrected),
    slopeInPerHour: trend && pairOf(trend.slopes),
    marginInPerHour: trend && trend.margin,
    series: study.series.map(({ reading, corrected, isUsed }) => ({
      at: instantOf(reading.atMs),
      levelIn: flip(reading.value),
      correctedIn: flipPair(corrected),
      used: isUsed,
    })),
    forecast: forecast && {
      ...forecastPart(forecast, { from: flipAll(forecast.from), to: flipAll(forecast.to) }),
      topUpToIn: null,
    },
  };
}

const flipPair = ([low, high]: Pair): Pair => [flip(high), flip(low)];
const flipAll = ({ low, mid, high }: Expected): Expected => ({ low: flip(low), mid: flip(mid), high: flip(high) });

function forecastPart(
  { basis, holdsThrough, reasons }: NonNullable<Study['forecast']>,
  { from, to }: { from: Expected; to: Expected },
): Omit<NonNullable<DwvHoldAnalysis['forecast']>, 'topUpToIn'> {
  return { basis, from, to, holdsThrough, reasons };
}

function commonOf(
  log: HoldLog,
  { standing, verdict, gaugeFinding, cautions }: Study,
): Pick<HoldAnalysis, 'patmPsi' | 'verdict' | 'toppedUpAt' | 'topUps' | 'settledAt' | 'gaugeFinding' | 'cautions'> {
  return {
    patmPsi: log.patmPsi,
    verdict,
    toppedUpAt: instantOrNull(standing.toppedUpAtMs),
    topUps: standing.topUps,
    settledAt: instantOrNull(standing.settledAtMs),
    gaugeFinding,
    cautions,
  };
}
