import { z } from 'zod';
import { media } from '../holds/hold.states.js';
import {
  choice,
  defaulted,
  flag,
  list,
  notNegative,
  number,
  optional,
  positive,
  siteElevationFt,
  strict,
} from './field-kinds.js';
import { caution, reason } from './findings.js';
import { forecastRequest, levelReading, pressureReading } from './hold-readings.js';
import { refuseIn } from './house-refusals.js';
import { hydraulicLimits } from './hydraulic-limits.js';
import { refuseHoldInput } from './hold-refusals.js';

const commonFields = {
  elevationFt: defaulted(siteElevationFt, 0),
  holdMinutes: notNegative,
  settleMinutes: defaulted(notNegative, 0),
  plastic: defaulted(flag, false),
  forecast: optional(forecastRequest),
};

/** A water test's log: gauge psi against a minimum. */
export const waterHoldInput = strict({
  medium: choice(media),
  ...commonFields,
  minimumPsi: notNegative,
  ceilingPsi: optional(number),
  gauge: strict({ incrementPsi: positive }),
  readings: defaulted(list(pressureReading, hydraulicLimits.readings), []),
}).superRefine((input, ctx) => refuseHoldInput(input, refuseIn(ctx)));
export type WaterHoldInput = z.output<typeof waterHoldInput>;

/** A DWV test's log: inches of water below the rim against the most it may fall. It has no medium. */
export const dwvHoldInput = strict({
  medium: z.null().optional(),
  ...commonFields,
  maximumFallIn: notNegative,
  gauge: strict({ incrementIn: positive }),
  readings: defaulted(list(levelReading, hydraulicLimits.readings), []),
}).superRefine((input, ctx) => refuseHoldInput(input, refuseIn(ctx)));
export type DwvHoldInput = z.output<typeof dwvHoldInput>;

/** Input of `POST /api/calc/hold`. */
export const holdInput = z.discriminatedUnion('medium', [waterHoldInput, dwvHoldInput], {
  error: (issue) => (issue.code === 'invalid_union' ? 'not-one-of-the-choices' : 'must-be-an-object'),
});
export type HoldInput = z.output<typeof holdInput>;
export type HoldGiven = z.input<typeof holdInput>;

export const holdVerdicts = [
  'none',
  'below',
  'settling',
  'too-soon',
  'slow-fall',
  'dropping',
  'temperature',
  'holding',
] as const;
export type HoldVerdict = (typeof holdVerdicts)[number];

/** Worst first. */
export const gaugeFindings = [
  'system-dropped',
  'open-the-valve-to-know',
  'gauge-leaks-system-held',
  'gauge-sound',
] as const;
export type GaugeFinding = (typeof gaugeFindings)[number];

export const forecastBases = ['trend', 'temperature-only'] as const;
export type ForecastBasis = (typeof forecastBases)[number];

export const holdsThroughAnswers = ['yes', 'maybe', 'no'] as const;
export type HoldsThrough = (typeof holdsThroughAnswers)[number];

/** [smaller, larger] over the rules of the medium. */
const pair = z.tuple([z.number(), z.number()]);
export type Pair = z.infer<typeof pair>;

/** What a system is expected to show; `low` is the lower pressure, or the lower water. */
const expected = z.object({ low: z.number(), mid: z.number(), high: z.number() });
export type Expected = z.infer<typeof expected>;

const commonAnswer = {
  patmPsi: z.number(),
  verdict: z.enum(holdVerdicts),
  toppedUpAt: z.string().nullable(),
  topUps: z.number().int(),
  settledAt: z.string().nullable(),
  gaugeFinding: z.enum(gaugeFindings).nullable(),
  cautions: z.array(caution),
};

const commonForecast = {
  basis: z.enum(forecastBases),
  from: expected,
  to: expected,
  holdsThrough: z.enum(holdsThroughAnswers),
  reasons: z.array(reason),
};

/** Answer of `POST /api/calc/hold` for a water test: gauge psi, psi per hour, unrounded. */
export const waterHoldAnalysis = z.object({
  ...commonAnswer,
  credibleDropPsi: z.number(),
  rawDropPsi: z.number().nullable(),
  correctedDropPsi: pair.nullable(),
  slopePsiPerHour: pair.nullable(),
  marginPsiPerHour: z.number().nullable(),
  series: z.array(z.object({ at: z.string(), psi: z.number(), correctedPsi: pair, used: z.boolean() })),
  forecast: z.object({ ...commonForecast, topUpToPsi: z.number().nullable() }).nullable(),
});
export type WaterHoldAnalysis = z.infer<typeof waterHoldAnalysis>;

/** The same for a DWV test: inches below the rim; a drop is positive where water was lost, a slope negative. */
export const dwvHoldAnalysis = z.object({
  ...commonAnswer,
  credibleDropIn: z.number(),
  rawDropIn: z.number().nullable(),
  correctedDropIn: pair.nullable(),
  slopeInPerHour: pair.nullable(),
  marginInPerHour: z.number().nullable(),
  series: z.array(z.object({ at: z.string(), levelIn: z.number(), correctedIn: pair, used: z.boolean() })),
  forecast: z.object({ ...commonForecast, topUpToIn: z.null() }).nullable(),
});
export type DwvHoldAnalysis = z.infer<typeof dwvHoldAnalysis>;

export const holdAnalysis = z.union([waterHoldAnalysis, dwvHoldAnalysis]);
export type HoldAnalysis = z.infer<typeof holdAnalysis>;
