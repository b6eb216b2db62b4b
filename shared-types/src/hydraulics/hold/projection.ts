import type { Expected, ForecastBasis } from '../hold.contract.js';
import { isBelow } from '../tolerance.js';
import type { ForecastRequest, HoldLog, LogReading } from './hold-log.js';
import { carry } from './rules.js';
import type { Standing } from './standing.js';
import { msPerHour, type Trend } from './trend.js';

/** A trend is trusted for so many times the span it was seen over. */
const trustedSpans = 4;

/** Carries a system that stands at some value at the last reading's time and temperature forward to the window. */
export interface Projection {
  basis: ForecastBasis;
  /** What is expected `hours` after the last reading of a system that stood at `value` then. */
  expect: (value: number, hours: number) => Expected;
  hoursToFrom: number;
  hoursToTo: number;
}

export function projectionOf(
  log: HoldLog,
  standing: Standing,
  trend: Trend,
  request: ForecastRequest,
): Projection | null {
  const { reference, last } = standing;
  if (!reference || !last) return null;
  const hoursTo = (atMs: number): number => Math.max(0, (atMs - last.atMs) / msPerHour);
  const hoursToTo = hoursTo(request.toMs);
  const spanHours = (last.atMs - reference.atMs) / msPerHour;
  const basis: ForecastBasis = isBelow(spanHours * trustedSpans, hoursToTo) ? 'temperature-only' : 'trend';
  const values = valuesLater(log, reference, last, basis === 'trend' ? trend.slopes : [], request.temperatureF);
  const spread = (hours: number): number =>
    basis === 'trend' ? trend.margin * hours + log.increment / 2 : log.increment;
  return {
    basis,
    expect: (value, hours) => around(values(value, hours), spread(hours)),
    hoursToFrom: hoursTo(request.fromMs),
    hoursToTo,
  };
}

/**
 * Per rule: corrected to the reference, moved along the slope, taken back to the forecast temperature (none given: the last reading's). A
 * last reading that was not corrected is not taken back either.
 */
function valuesLater(
  { rules }: HoldLog,
  reference: LogReading,
  last: LogReading,
  slopes: readonly number[],
  temperatureF: number | null,
): (value: number, hours: number) => number[] {
  const thenF = last.temperatureF === null ? null : (temperatureF ?? last.temperatureF);
  return (value, hours) =>
    rules.map((rule, index) => {
      const corrected = carry(rule, value, last.temperatureF, reference.temperatureF);
      return carry(rule, corrected + (slopes[index] ?? 0) * hours, reference.temperatureF, thenF);
    });
}

function around(values: readonly number[], spread: number): Expected {
  const mid = values.reduce((sum, value) => sum + value, 0) / values.length;
  return { low: Math.min(...values) - spread, mid, high: Math.max(...values) + spread };
}
