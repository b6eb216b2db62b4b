import { type z } from 'zod';
import { dwvMethods } from '../holds/hold.states.js';
import { dwvRule } from './dwv-rule.js';
import {
  choice,
  defaulted,
  flag,
  notNegative,
  number,
  optional,
  positive,
  siteElevationFt,
  strict,
  waterTemperatureF,
} from './field-kinds.js';
import { dwvHouseShape } from './house-fields.js';

/** The fields of a DWV plan, before what contradicts is refused. */
export const dwvPlanFields = strict({
  ...dwvHouseShape,
  lowestFittingFt: number,
  highestFittingFt: number,
  method: choice(dwvMethods),
  riserIn: defaulted(notNegative, 18),
  airPsi: optional(notNegative),
  airVolumeGal: optional(notNegative),
  maxSectionFt: optional(positive),
  rule: dwvRule,
  makersAllowAir: defaulted(flag, false),
  fillRateGpm: optional(positive),
  waterTempF: defaulted(waterTemperatureF, 60),
  elevationFt: defaulted(siteElevationFt, 0),
});
export type DwvPlanFields = z.output<typeof dwvPlanFields>;
