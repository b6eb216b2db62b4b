import { z } from 'zod';
import { isAbove, isBelow } from './tolerance.js';

/** One section under test at a time, feet above the first floor, and the head at its foot. */
export const lift = z.object({ fromFt: z.number(), toFt: z.number(), headFt: z.number() });
export type Lift = z.infer<typeof lift>;

/** Feet of the section before that are tested again where the rule names none (IPC 312.2: its upper 10 ft). */
export const defaultOverlapFt = 10;

/** How many lifts of `sectionFt` with `overlapFt` between them cover `spanFt`. */
export const sectionCount = (spanFt: number, sectionFt: number, overlapFt: number): number =>
  Math.max(1, Math.ceil((spanFt - overlapFt) / (sectionFt - overlapFt) - 1e-9));

/**
 * A stack tested by sections, from the lowest fitting up: each lift is `sectionFt` high, the next starts `overlapFt` below its top, the last
 * ends at the vent terminal. Needs `overlapFt` below `sectionFt`.
 */
export function liftsOf(lowestFittingFt: number, ventTerminalFt: number, sectionFt: number, overlapFt: number): Lift[] {
  const count = sectionCount(ventTerminalFt - lowestFittingFt, sectionFt, overlapFt);
  return Array.from({ length: count }, (_, index) => {
    const fromFt = lowestFittingFt + index * (sectionFt - overlapFt);
    const toFt = index === count - 1 ? ventTerminalFt : fromFt + sectionFt;
    return { fromFt, toFt, headFt: toFt - fromFt };
  });
}

/** The greatest head that any lift puts on a point; below the lowest fitting the first lift's, above the vent terminal none. */
export function headInLiftsFt(elevationFt: number, lifts: readonly Lift[]): number {
  const [first] = lifts;
  if (first && isBelow(elevationFt, first.fromFt)) return first.toFt - elevationFt;
  const heads = lifts
    .filter(({ fromFt, toFt }) => !isBelow(elevationFt, fromFt) && !isAbove(elevationFt, toFt))
    .map(({ toFt }) => Math.max(0, toFt - elevationFt));
  return Math.max(0, ...heads);
}
