import { z } from 'zod';
import type { IssueCode } from './issue-codes.js';

/** No length, pressure or rate of a house comes near this; it keeps every product finite. */
const largest = 1e9;

type Raised = { input?: unknown; code?: string };

/** Names a missing value `required` and any other of the wrong kind `wrong`. */
const missingOr =
  (wrong: IssueCode) =>
  (issue: Raised): IssueCode =>
    issue.input === undefined ? 'required' : wrong;

/** A finite number; NaN and the infinities are refused as not being numbers. */
export const number = z
  .number({ error: missingOr('must-be-a-number') })
  .min(-largest, 'out-of-range')
  .max(largest, 'out-of-range');
/** Above zero by more than comparisons allow, so that nothing is ever divided by next to nothing. */
export const positive = number.gt(1e-9, 'must-be-positive');
export const notNegative = number.min(0, 'must-not-be-negative');
export const count = z
  .int({ error: missingOr('must-be-a-whole-number') })
  .min(0, 'must-not-be-negative')
  .max(1000, 'out-of-range');

export const flag = z.boolean({ error: missingOr('must-be-yes-or-no') });
export const name = z
  .string({ error: missingOr('must-be-text') })
  .min(1, 'required')
  .max(100, 'too-long');

/** °F, above absolute zero (−459.67 °F). */
export const temperatureF = number.gt(-459.67, 'at-or-below-absolute-zero');

/** Water that is neither ice nor steam at standard pressure, °F. */
export const waterTemperatureF = number
  .min(32, 'water-temperature-out-of-range')
  .max(212, 'water-temperature-out-of-range');

/** Site elevation in feet, from the lowest dry land to the top of the layer that the atmosphere's formula describes (11 km). */
export const siteElevationFt = number.min(-1500, 'out-of-range').max(36_089, 'out-of-range');

/** An instant, ISO 8601 with `Z` or an offset; a date that does not exist is refused. */
export const instant = z.iso
  .datetime({ offset: true, error: missingOr('must-be-an-instant') })
  .refine((value) => Number.isFinite(Date.parse(value)), 'must-be-an-instant');

export const choice = <const T extends readonly [string, ...string[]]>(values: T) =>
  z.enum(values, { error: missingOr('not-one-of-the-choices') });

export const list = <T extends z.ZodType>(item: T, most: number) =>
  z.array(item, { error: missingOr('must-be-a-list') }).max(most, 'too-many');

/** An object whose unknown keys are refused. */
export const strict = <T extends z.core.$ZodLooseShape>(shape: T) =>
  z.strictObject(shape, {
    error: (issue) => (issue.code === 'unrecognized_keys' ? 'unknown' : missingOr('must-be-an-object')(issue)),
  });

/** May be left out; null means absent, and absent is read as null. */
export const optional = <T extends z.ZodType>(schema: T) => schema.nullable().default(null as never);

type Defaulted<T extends z.ZodType> = z.ZodType<
  z.output<T>,
  z.input<T> | null | undefined,
  z.core.$ZodTypeInternals<z.output<T>, z.input<T> | null | undefined> & { optin: 'optional' }
>;

/** May be left out or null, and is then `value`. */
export function defaulted<T extends z.ZodType>(schema: T, value: z.output<T>): Defaulted<T> {
  const filled: z.ZodType = z.preprocess((given) => given ?? undefined, schema.default(value as never));
  return filled as Defaulted<T>;
}
