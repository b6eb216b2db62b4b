import { type z } from 'zod';
import { media } from '../holds/hold.states.js';
import { choice, defaulted, flag, list, notNegative, optional, strict } from './field-kinds.js';
import { gaugeIncrements } from './gauge-rule.js';
import { hydraulicLimits } from './hydraulic-limits.js';

export const measuringPoints = ['gauge', 'highest-outlet'] as const;

/** What a rule card asks of a water test, as far as it is computed with. */
export const waterRule = strict({
  minimumPsi: notNegative,
  preferredPsi: optional(notNegative),
  measuredAt: defaulted(choice(measuringPoints), 'gauge'),
  media: defaulted(list(choice(media), hydraulicLimits.methods), []),
  airOnPlastic: defaulted(flag, false),
  gaugeIncrements,
});
export type WaterRule = z.output<typeof waterRule>;
