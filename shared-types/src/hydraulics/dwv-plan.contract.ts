import { z } from 'zod';
import { takeDownItems, type TakeDownItem } from '../clearances/take-down.js';
import { refuseDwvInput } from './dwv-refusals.js';
import { lift } from './dwv-lifts.js';
import { dwvPlanFields } from './dwv-plan.fields.js';
import { caution, reason } from './findings.js';
import { refuseIn } from './house-refusals.js';

/** Input of `POST /api/calc/dwv-plan`. Elevations in feet above the finished first floor. */
export const dwvPlanInput = dwvPlanFields.superRefine((input, ctx) => refuseDwvInput(input, refuseIn(ctx)));
export type DwvPlanInput = z.output<typeof dwvPlanInput>;
export type DwvPlanGiven = z.input<typeof dwvPlanInput>;

const maybe = z.number().nullable();
export const takeDownCode = z.enum(Object.keys(takeDownItems) as [TakeDownItem, ...TakeDownItem[]]);

export const dwvLevel = z.object({ name: z.string(), elevationFt: z.number(), headFt: maybe, pressurePsi: z.number() });
export const plugLoad = z.object({
  name: z.string(),
  elevationFt: z.number(),
  headFt: maybe,
  pressurePsi: z.number(),
  ratedPsi: z.number(),
  loadFraction: z.number(),
  forceLbf: maybe,
});

/** Answer of `POST /api/calc/dwv-plan`, unrounded. */
export const dwvPlan = z.object({
  fillLevelFt: maybe,
  requiredLevelFt: maybe,
  shortByFt: maybe,
  usable: z.boolean(),
  reasons: z.array(reason),
  levels: z.array(dwvLevel),
  notUnderTest: z.array(z.object({ fromFt: z.number(), toFt: z.number() })),
  plugs: z.array(plugLoad),
  volumeGal: maybe,
  weightLb: maybe,
  fillMinutes: maybe,
  lifts: z.array(lift).nullable(),
  air: z.object({ pressurePsi: z.number(), energyFtLbf: z.number() }).nullable(),
  takeDown: z.array(takeDownCode),
  cautions: z.array(caution),
});
export type DwvPlan = z.infer<typeof dwvPlan>;
export type DwvLevel = z.infer<typeof dwvLevel>;
export type PlugLoad = z.infer<typeof plugLoad>;
