import { z } from 'zod';

/** Why a plan is not usable, or a forecast is what it is. */
export const reasonCodes = [
  'method-not-accepted',
  'laundry-not-on-lowest-floor',
  'laundry-on-lowest-floor',
  'level-short',
  'plug-overloaded',
  'air-on-plastic',
  'medium-not-accepted',
  'above-rated-part',
  'gauge-too-coarse',
  'gauge-range',
  'temperature-only',
  'read-again',
  'find-the-leak',
  'over-ceiling',
  'over-ceiling-when-warm',
] as const;
export type ReasonCode = (typeof reasonCodes)[number];

/** What may hurt somebody or mislead; each stands beside the number it concerns. The last three rows are raised by pages alone. */
export const cautionCodes = [
  'over-ceiling',
  'compressed-air',
  'shut-gauge',
  'under-pressure',
  'plug-load',
  'plug-stand-aside',
  'floors-not-under-test',
  'freeze-risk',
  'freeze',
  'sealed-water-warms',
  'water-temperature',
  'air-dissolves',
  'level-moves-with-temperature',
  'settling',
  'discharge',
  'backflow',
  'potable-only',
  'close-the-main',
  'relief-valve',
  'attic',
  'roof',
  'ladder',
  'trench',
  'temperature-missing',
  'one-reading',
  'many-top-ups',
  'local-code',
  'cement-cure',
  'power',
  'occupied-below',
] as const;
export type CautionCode = (typeof cautionCodes)[number];

/** What the words of a code are filled with: numbers unrounded, names as given. */
const params = z.record(z.string(), z.union([z.number(), z.string(), z.array(z.string())]));
export type FindingParams = z.infer<typeof params>;

export const reason = z.object({ code: z.enum(reasonCodes), params });
export type Reason = z.infer<typeof reason>;

export const caution = z.object({ code: z.enum(cautionCodes), params });
export type Caution = z.infer<typeof caution>;

export const reasonOf = (code: ReasonCode, given: FindingParams = {}): Reason => ({ code, params: given });
export const cautionOf = (code: CautionCode, given: FindingParams = {}): Caution => ({ code, params: given });

/** A list of what holds: `when(condition, make)` keeps lists of findings readable. */
export const when = <T>(holds: boolean, make: () => T): T[] => (holds ? [make()] : []);
