import { z } from 'zod';
import { media } from '../holds/hold.states.js';
import { takeDownCode } from './dwv-plan.contract.js';
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
import { caution, reason } from './findings.js';
import { floors, materialList } from './house-fields.js';
import { refuseAbove, refuseFloorsNamedTwice, refuseIn } from './house-refusals.js';
import { waterRule } from './water-rule.js';

const waterPlanFields = strict({
  gaugeFt: number,
  highestOutletFt: number,
  lowestFittingFt: number,
  floors,
  medium: choice(media),
  pipeMaterials: materialList,
  makersAllowAir: defaulted(flag, false),
  airVolumeGal: optional(notNegative),
  rule: waterRule,
  lowestRatedPsi: positive,
  lowestRatedAirPsi: optional(positive),
  supplyPsi: optional(notNegative),
  gauge: strict({ rangePsi: positive, incrementPsi: positive }),
  waterTempF: defaulted(waterTemperatureF, 60),
  elevationFt: defaulted(siteElevationFt, 0),
});

/** Input of `POST /api/calc/water-plan`. Elevations in feet above the finished first floor, gauge psi. */
export const waterPlanInput = waterPlanFields.superRefine((input, ctx) => {
  const refuse = refuseIn(ctx);
  refuseFloorsNamedTwice(input.floors, refuse);
  refuseAbove(input.lowestFittingFt, input.highestOutletFt, ['lowestFittingFt'], 'lowest-above-highest', refuse);
});
export type WaterPlanInput = z.output<typeof waterPlanInput>;
export type WaterPlanGiven = z.input<typeof waterPlanInput>;

/** Answer of `POST /api/calc/water-plan`, unrounded; pressures are what a gauge would show there when the plan's gauge shows `targetPsi`. */
export const waterPlan = z.object({
  floorPsi: z.number(),
  targetPsi: z.number(),
  ceilingPsi: z.number(),
  usable: z.boolean(),
  reasons: z.array(reason),
  needsTopUp: z.boolean().nullable(),
  requiredIncrementPsi: z.number(),
  storedEnergyFtLbf: z.number().nullable(),
  levels: z.array(z.object({ name: z.string(), elevationFt: z.number(), pressurePsi: z.number() })),
  takeDown: z.array(takeDownCode),
  cautions: z.array(caution),
});
export type WaterPlan = z.infer<typeof waterPlan>;
