import { type z } from 'zod';
import {
  defaulted,
  flag,
  list,
  notNegative,
  optional,
  positive,
  strict,
  waterTemperatureF,
} from '../hydraulics/field-kinds.js';
import { plug } from '../hydraulics/house-fields.js';
import { hydraulicLimits } from '../hydraulics/hydraulic-limits.js';

const gauge = strict({ rangePsi: positive, incrementPsi: positive });

/** What most water tests are read on until the plumber names another: 0 to 200 psi by 1 (common practice, no published source). */
export const usualGauge = { rangePsi: 200, incrementPsi: 1 } as const;

/** The longest section where nobody names one: 30 ft, as one city caps it (see the sectional rule of IPC 312.2). */
export const usualSectionFt = 30;

/** What the plumber brings to a test and the house does not know. Left out: the usual. */
export const planTools = strict({
  gauge: defaulted(gauge, usualGauge),
  fillRateGpm: optional(positive),
  /** Of the water that goes in. */
  waterTempF: defaulted(waterTemperatureF, 60),
  /** The laundry riser's height over its branch. */
  riserIn: defaulted(notNegative, 18),
  maxSectionFt: defaulted(positive, usualSectionFt),
  /** For air in drains where the rule card names no pressure. */
  airPsi: optional(notNegative),
  airVolumeGal: optional(notNegative),
  makersAllowAir: defaulted(flag, false),
  /** The plugs at hand; null: those the house is noted with. */
  plugs: optional(list(plug, hydraulicLimits.plugs)),
});
export type PlanTools = z.output<typeof planTools>;
export type PlanToolsGiven = z.input<typeof planTools>;

export const usualTools = (): PlanTools => planTools.parse({});
