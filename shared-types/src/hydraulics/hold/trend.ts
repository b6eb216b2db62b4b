import { medianSlope, pairwiseSlopes, senInterval } from '../theil-sen.js';
import type { LogReading } from './hold-log.js';
import { carry, type Rule } from './rules.js';

export const msPerHour = 3_600_000;

/** From so many readings on, the scatter of the readings themselves says how sure the slope is. */
const enoughForInterval = 6;

/** How the system moves: one slope per rule of its medium, and how far either may be off, per hour. */
export interface Trend {
  slopes: readonly number[];
  margin: number;
}

/** Theil–Sen slopes of the used readings, corrected to the first of them by each rule. Null without readings. */
export function trendOf(used: readonly LogReading[], rules: readonly Rule[], increment: number): Trend | null {
  const [first] = used;
  const last = used.at(-1);
  if (!first || !last) return null;
  if (first === last) return { slopes: rules.map(() => 0), margin: 0 };
  const sorted = rules.map((rule) =>
    pairwiseSlopes(
      used.map(({ atMs, value, temperatureF }) => ({
        x: (atMs - first.atMs) / msPerHour,
        y: carry(rule, value, temperatureF, first.temperatureF),
      })),
    ),
  );
  const byGauge = increment / ((last.atMs - first.atMs) / msPerHour);
  const byScatter = used.length < enoughForInterval ? [] : sorted.map((slopes) => halfWidth(slopes, used.length));
  return { slopes: sorted.map(medianSlope), margin: Math.max(byGauge, ...byScatter) };
}

function halfWidth(sortedSlopes: readonly number[], readingCount: number): number {
  const interval = senInterval(sortedSlopes, readingCount);
  return interval === null ? 0 : (interval.high - interval.low) / 2;
}
