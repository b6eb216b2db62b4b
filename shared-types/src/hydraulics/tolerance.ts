/** Two numbers nearer than this are equal; it swallows the rounding of binary fractions and nothing a gauge could show. */
const tolerance = 1e-9;

export const isAbove = (value: number, limit: number): boolean => value > limit + tolerance;
export const isBelow = (value: number, limit: number): boolean => value < limit - tolerance;

/** Strips what binary fractions add to a multiple of a decimal increment: 3 × 0.1 is 0.3. */
const clean = (value: number): number => Number(value.toPrecision(12));

/** The largest multiple of `increment` not above `value`. */
export const roundDownTo = (increment: number, value: number): number =>
  clean(Math.floor((value + tolerance) / increment) * increment);

/** The smallest multiple of `increment` not below `value`. */
export const roundUpTo = (increment: number, value: number): number =>
  clean(Math.ceil((value - tolerance) / increment) * increment);

/** The smallest multiple of `increment` above `value`. */
export const nextMultipleAbove = (increment: number, value: number): number =>
  clean((Math.floor((value + tolerance) / increment) + 1) * increment);
