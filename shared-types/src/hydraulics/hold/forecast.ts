import { reasonOf, type Reason } from '../findings.js';
import type { Expected, ForecastBasis, HoldsThrough, HoldVerdict } from '../hold.contract.js';
import { isBelow } from '../tolerance.js';
import type { HoldLog } from './hold-log.js';
import { projectionOf } from './projection.js';
import type { Standing } from './standing.js';
import { topUpOf } from './top-up.js';
import type { Trend } from './trend.js';

export interface Forecast {
  basis: ForecastBasis;
  from: Expected;
  to: Expected;
  holdsThrough: HoldsThrough;
  topUpTo: number | null;
  reasons: Reason[];
}

/** Whether the test will still stand at both ends of the window, and what to pump it to if not. Null without a window or a used reading. */
export function forecastOf(
  log: HoldLog,
  standing: Standing,
  trend: Trend | null,
  verdict: HoldVerdict,
): Forecast | null {
  const { last, reference } = standing;
  const minimum = log.minimumFrom(reference?.value ?? null);
  const projection = log.forecast && trend && projectionOf(log, standing, trend, log.forecast);
  if (!projection || !last || minimum === null) return null;
  const { basis, expect } = projection;
  const from = expect(last.value, projection.hoursToFrom);
  const to = expect(last.value, projection.hoursToTo);
  const holdsThrough = holdsThroughOf([from, to], minimum, basis);
  const topUp =
    holdsThrough === 'yes' ? { value: null, reason: null } : topUpOf(log, last, projection, verdict, minimum);
  const reasons = basis === 'temperature-only' ? [reasonOf('temperature-only')] : [];
  if (topUp.reason) reasons.push(topUp.reason);
  return { basis, from, to, holdsThrough, topUpTo: topUp.value, reasons };
}

/** Without a trend nobody can promise more than `maybe`. */
function holdsThroughOf(ends: readonly Expected[], minimum: number, basis: ForecastBasis): HoldsThrough {
  if (ends.some(({ high }) => isBelow(high, minimum))) return 'no';
  return basis === 'trend' && ends.every(({ low }) => !isBelow(low, minimum)) ? 'yes' : 'maybe';
}
