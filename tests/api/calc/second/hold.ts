import { forecastOf } from './hold-forecast.js';
import { gaugeFindingOf, type Log, readLog, rulesOf, valuesAt } from './hold-log.js';
import type { HoldRequest } from './hold.input.js';
import { atmospherePsi, isAbove } from './physics.js';
import { hoursBetween, medianOf, pairwiseSlopes, senInterval } from './theil-sen.js';

/** What the readings amount to, one entry per rule of the medium. */
export interface Trend {
  slopes: number[];
  margin: number;
  spanHours: number;
  /** The last used reading, corrected. */
  last: number[];
}

/** The answer to a log of a line under pressure, as the design's section 4 has it, computed a second time. */
export function secondHold(given: HoldRequest) {
  const log = readLog(given);
  const trend = trendOf(given, log);
  const credibleDropPsi = given.gauge.incrementPsi;
  const reference = log.used[0];
  const drops = trend && reference ? pair(trend.last.map((value) => reference.psi - value)) : null;
  const rawDropPsi = reference ? reference.psi - (log.used.at(-1)?.psi ?? NaN) : null;
  const verdict = verdictOf(given, log, trend, drops, rawDropPsi);
  return {
    patmPsi: atmospherePsi(given.elevationFt ?? 0),
    verdict,
    credibleDropPsi,
    rawDropPsi,
    correctedDropPsi: drops,
    slopePsiPerHour: trend ? pair(trend.slopes) : null,
    marginPsiPerHour: trend ? trend.margin : null,
    toppedUpAt: log.toppedUpAt,
    topUps: log.topUps,
    settledAt: log.settledAt,
    gaugeFinding: gaugeFindingOf(given, log),
    series: log.open.map((reading) => ({
      at: reading.at,
      psi: reading.psi,
      correctedPsi: pair(reference ? valuesAt(given, reading, reference) : [reading.psi]),
      used: log.used.includes(reading),
    })),
    forecast: trend && given.forecast ? forecastOf(given, given.forecast, log, trend, verdict) : null,
  };
}

const pair = (values: number[]): [number, number] => [Math.min(...values), Math.max(...values)];

/** Steps 3 and 4; null without a used reading. */
function trendOf(given: HoldRequest, { used }: Log): Trend | null {
  const reference = used[0];
  const final = used.at(-1);
  if (!reference || !final) return null;
  const last = valuesAt(given, final, reference);
  const rules = rulesOf(given);
  if (used.length === 1) return { slopes: rules.map(() => 0), margin: 0, spanHours: 0, last };
  const times = used.map(({ at }) => at);
  const spanHours = hoursBetween(reference.at, final.at);
  const sorted = rules.map((_, n) =>
    pairwiseSlopes(
      times,
      used.map((reading) => valuesAt(given, reading, reference)[n] ?? NaN),
    ),
  );
  const widths = sorted.map((slopes) => {
    const [low, high] = senInterval(slopes, used.length);
    return (high - low) / 2;
  });
  const coarse = given.gauge.incrementPsi / spanHours;
  const margin = used.length < 6 ? coarse : Math.max(coarse, ...widths);
  return { slopes: sorted.map(medianOf), margin, spanHours, last };
}

/** Step 5. */
function verdictOf(
  given: HoldRequest,
  { open, used }: Log,
  trend: Trend | null,
  drops: [number, number] | null,
  rawDropPsi: number | null,
): string {
  const credible = given.gauge.incrementPsi;
  const last = open.at(-1);
  if (!last) return 'none';
  if (isAbove(given.minimumPsi, last.psi)) return 'below';
  if (!trend || !drops || rawDropPsi === null) return 'settling';
  if (used.length === 1 || isAbove(given.holdMinutes, trend.spanHours * 60)) return 'too-soon';
  const perHour = Math.min(...trend.slopes.map(Math.abs));
  if (isAbove(drops[0], credible)) {
    const isSlow = !isAbove(perHour * 4, credible);
    return given.plastic === true && isSlow ? 'slow-fall' : 'dropping';
  }
  return isAbove(rawDropPsi, credible) ? 'temperature' : 'holding';
}
