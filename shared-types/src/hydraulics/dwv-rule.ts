import { z } from 'zod';
import { dwvMethods } from '../holds/hold.states.js';
import { choice, defaulted, flag, list, notNegative, optional, strict } from './field-kinds.js';
import { hydraulicLimits } from './hydraulic-limits.js';

export const headRuleKinds = ['above-highest-fitting', 'fill-level'] as const;

/**
 * How high the water has to stand: so many feet above the highest fitting (or to the top of the system), or just to the method's own level.
 * `feet` is also how much of the section before is tested again when a stack is tested by sections.
 */
export const headRule = z.discriminatedUnion(
  'kind',
  [
    strict({ kind: z.literal('above-highest-fitting'), feet: notNegative }),
    strict({ kind: z.literal('fill-level'), feet: optional(notNegative) }),
  ],
  { error: ({ input }) => (input === undefined ? 'required' : 'not-one-of-the-choices') },
);
export type HeadRule = z.output<typeof headRule>;

/** What a rule card asks of a DWV test, as far as it is computed with. */
export const dwvRule = strict({
  acceptedMethods: defaulted(list(choice(dwvMethods), hydraulicLimits.methods), []),
  headRule: optional(headRule),
  airOnPlastic: defaulted(flag, false),
});
export type DwvRule = z.output<typeof dwvRule>;
