import type { Medium } from '../../holds/hold.states.js';
import { atmospherePsi } from '../air.js';
import type { DwvHoldInput, WaterHoldInput } from '../hold.contract.js';
import { rulesOf, type Rule } from './rules.js';

/** A reading in either kind of test; `value` grows with what the system holds (gauge psi, or inches below the rim made negative). */
export interface LogReading {
  atMs: number;
  value: number;
  temperatureF: number | null;
  isOpen: boolean;
}

export interface ForecastRequest {
  fromMs: number;
  toMs: number;
  temperatureF: number | null;
  coldestF: number | null;
  hottestF: number | null;
}

/** A test's log, the same for pressure and level. */
export interface HoldLog {
  medium: Medium | null;
  rules: readonly [Rule, ...Rule[]];
  patmPsi: number;
  increment: number;
  /** The least that may be read; it may hang on the reading the test started from, null while there is none. */
  minimumFrom: (referenceValue: number | null) => number | null;
  ceiling: number | null;
  holdMs: number;
  settleMs: number;
  isPlastic: boolean;
  readings: readonly LogReading[];
  forecast: ForecastRequest | null;
}

const msPerMinute = 60_000;

export function waterLog(input: WaterHoldInput): HoldLog {
  const patmPsi = atmospherePsi(input.elevationFt);
  return {
    ...commonOf(input),
    medium: input.medium,
    rules: rulesOf(input.medium, patmPsi),
    increment: input.gauge.incrementPsi,
    minimumFrom: () => input.minimumPsi,
    ceiling: input.ceilingPsi,
    readings: input.readings.map(({ at, psi, temperatureF, gaugeValve }) => ({
      atMs: Date.parse(at),
      value: psi,
      temperatureF,
      isOpen: gaugeValve === 'open',
    })),
  };
}

export function dwvLog(input: DwvHoldInput): HoldLog {
  return {
    ...commonOf(input),
    medium: null,
    rules: rulesOf(null, atmospherePsi(input.elevationFt)),
    increment: input.gauge.incrementIn,
    minimumFrom: (reference) => (reference === null ? null : reference - input.maximumFallIn),
    ceiling: null,
    readings: input.readings.map(({ at, levelIn, temperatureF }) => ({
      atMs: Date.parse(at),
      value: flip(levelIn),
      temperatureF,
      isOpen: true,
    })),
  };
}

/** Inches below the rim to a value that grows with the water, and back; zero stays a plain zero. */
export const flip = (value: number): number => 0 - value;

function commonOf(
  input: WaterHoldInput | DwvHoldInput,
): Pick<HoldLog, 'patmPsi' | 'holdMs' | 'settleMs' | 'isPlastic' | 'forecast'> {
  const { forecast } = input;
  return {
    patmPsi: atmospherePsi(input.elevationFt),
    holdMs: input.holdMinutes * msPerMinute,
    settleMs: input.settleMinutes * msPerMinute,
    isPlastic: input.plastic,
    forecast: forecast && { ...forecast, fromMs: Date.parse(forecast.from), toMs: Date.parse(forecast.to) },
  };
}
