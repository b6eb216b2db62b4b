import { z } from 'zod';
import { number, optional, positive, strict } from './field-kinds.js';
import { refuseIn } from './house-refusals.js';
import { angleBetween, isSamePoint } from './dial-angle.js';

const point = strict({ x: number, y: number });

/** A full turn in degrees, less what binary fractions blur. */
const nearlyFullTurn = 360 - 1e-9;

/** Input of `POST /api/calc/dial`: pixel points of a photo of a gauge, y growing downward. */
export const dialInput = strict({
  center: point,
  zeroMark: point,
  fullMark: point,
  needleTip: point,
  rangePsi: positive,
  typedPsi: optional(number),
  incrementPsi: optional(positive),
}).superRefine((input, ctx) => {
  const refuse = refuseIn(ctx);
  const onCenter = (['zeroMark', 'fullMark', 'needleTip'] as const).filter((key) =>
    isSamePoint(input[key], input.center),
  );
  for (const key of onCenter) refuse([key], 'point-on-center');
  if (onCenter.length > 0) return;
  const sweep = angleBetween(input.center, input.zeroMark, input.fullMark);
  if (sweep < 1e-9 || sweep > nearlyFullTurn) refuse(['fullMark'], 'marks-in-one-direction');
});
export type DialInput = z.output<typeof dialInput>;
export type DialGiven = z.input<typeof dialInput>;

/** Answer: what the needle shows, the dial's sweep, and whether the typed reading is within one increment of it (null without both). */
export const dialReading = z.object({ psi: z.number(), sweepDegrees: z.number(), agrees: z.boolean().nullable() });
export type DialReading = z.infer<typeof dialReading>;
