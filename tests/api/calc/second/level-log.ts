import { isAbove } from './physics.js';
import { hoursBetween, medianOf, pairwiseSlopes, senInterval } from './theil-sen.js';

/** The log of a DWV test: how far below the rim the water stands. */
export interface LevelRequest {
  readings: { at: string; levelIn: number; temperatureF?: number | null }[];
  gauge: { incrementIn: number };
  maximumFallIn: number;
  holdMinutes: number;
  forecast?: { from: string; to: string } | null;
}

/**
 * The answer to a log of a water level, in inches below the rim throughout: a larger number is lower water. What the text turns back
 * from P = −levelIn is not turned at all here.
 */
export function secondLevelLog(given: LevelRequest) {
  const increment = given.gauge.incrementIn;
  const filledUp = given.readings.flatMap(({ levelIn }, index) => {
    const before = given.readings[index - 1];
    return before && isAbove(before.levelIn - levelIn, increment) ? [index] : [];
  });
  const used = given.readings.slice(filledUp.at(-1) ?? 0);
  const first = used[0];
  const last = used.at(-1);
  const common = {
    credibleDropIn: increment,
    topUps: filledUp.length,
    toppedUpAt: filledUp.length > 0 ? (first?.at ?? null) : null,
    gaugeFinding: null,
  };
  if (!first || !last) {
    const none = { rawDropIn: null, correctedDropIn: null, slopeInPerHour: null, marginInPerHour: null };
    return { ...common, verdict: 'none', settledAt: null, ...none, series: [], forecast: null };
  }
  const dropIn = last.levelIn - first.levelIn;
  const spanHours = hoursBetween(first.at, last.at);
  const falls = pairwiseSlopes(
    used.map(({ at }) => at),
    used.map(({ levelIn }) => levelIn),
  );
  const fallPerHour = medianOf(falls);
  const margin = marginOf(falls, used.length, increment, spanHours);
  const lowestIn = first.levelIn + given.maximumFallIn;
  const verdict = (() => {
    if (isAbove(last.levelIn, lowestIn)) return 'below';
    if (used.length === 1 || isAbove(given.holdMinutes, spanHours * 60)) return 'too-soon';
    return isAbove(dropIn, increment) ? 'dropping' : 'holding';
  })();
  return {
    ...common,
    verdict,
    settledAt: first.at,
    rawDropIn: dropIn,
    correctedDropIn: [dropIn, dropIn],
    slopeInPerHour: [-fallPerHour, -fallPerHour],
    marginInPerHour: margin,
    // nothing settles here: every reading since the last filling is used
    series: used.map(({ at, levelIn }) => ({ at, levelIn, used: true })),
    forecast: given.forecast ? forecastOf(given.forecast) : null,
  };

  function forecastOf(asked: { from: string; to: string }) {
    const hoursTo = (at: string) => Math.max(0, hoursBetween(last?.at ?? '', at));
    const isTrend = !isAbove(hoursTo(asked.to), spanHours * 4);
    const [from, to] = [asked.from, asked.to].map((at) => {
      const mid = (last?.levelIn ?? NaN) + (isTrend ? fallPerHour * hoursTo(at) : 0);
      const off = isTrend ? margin * hoursTo(at) + increment / 2 : increment;
      return { low: mid + off, mid, high: mid - off };
    });
    if (!from || !to) throw new Error('two ends');
    const hasFallen = isAbove(from.high, lowestIn) || isAbove(to.high, lowestIn);
    const isSure = isTrend && !isAbove(from.low, lowestIn) && !isAbove(to.low, lowestIn);
    const basis = isTrend ? 'trend' : 'temperature-only';
    return { basis, from, to, holdsThrough: hasFallen ? 'no' : isSure ? 'yes' : 'maybe', topUpToIn: null };
  }
}

function marginOf(falls: number[], points: number, increment: number, spanHours: number): number {
  if (points === 1) return 0;
  const coarse = increment / spanHours;
  if (points < 6) return coarse;
  const [low, high] = senInterval(falls, points);
  return Math.max(coarse, (high - low) / 2);
}
