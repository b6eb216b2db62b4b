import type { HoldVerdict } from '../hold.contract.js';
import { isAbove, isBelow } from '../tolerance.js';
import type { HoldLog } from './hold-log.js';
import type { Standing } from './standing.js';
import type { Trend } from './trend.js';

/** A fall that takes so many hours for one increment may be plastic that goes on stretching. */
const slowHoursPerIncrement = 4;

export interface Drops {
  raw: number;
  /** One per rule of the medium. */
  corrected: readonly number[];
}

/** The first that applies, gravest facts first. */
export function verdictOf(log: HoldLog, standing: Standing, drops: Drops | null, trend: Trend | null): HoldVerdict {
  const lastOpen = standing.open.at(-1);
  if (!lastOpen) return 'none';
  const minimum = log.minimumFrom(standing.reference?.value ?? null);
  if (minimum !== null && isBelow(lastOpen.value, minimum)) return 'below';
  if (!drops || !trend) return 'settling';
  if (isTooSoon(log, standing)) return 'too-soon';
  if (isAbove(Math.min(...drops.corrected), log.increment))
    return log.isPlastic && isSlow(trend, log.increment) ? 'slow-fall' : 'dropping';
  return isAbove(drops.raw, log.increment) ? 'temperature' : 'holding';
}

function isTooSoon({ holdMs }: HoldLog, { reference, last, used }: Standing): boolean {
  return used.length < 2 || !reference || !last || isBelow(last.atMs - reference.atMs, holdMs);
}

function isSlow({ slopes }: Trend, increment: number): boolean {
  const nearestZero = Math.min(...slopes.map(Math.abs));
  return !isAbove(nearestZero * slowHoursPerIncrement, increment);
}
