import { z } from 'zod';
import {
  choice,
  count,
  defaulted,
  list,
  name,
  notNegative,
  number,
  optional,
  positive,
  strict,
} from './field-kinds.js';
import { hydraulicLimits } from './hydraulic-limits.js';
import { materials } from './materials.js';
import { nominalSizesIn, pipeKinds, waterSizesIn } from './pipes.js';

const nominalIn = z.literal([...nominalSizesIn], {
  error: ({ input }) => (input === undefined ? 'required' : 'not-one-of-the-choices'),
});

/** A floor by name, feet above the finished first floor (below is negative). */
export const floor = strict({ name, elevationFt: number });
export type Floor = z.output<typeof floor>;

/** A test plug; its rating is the user's, no table is published. */
export const plug = strict({ name, elevationFt: number, ratedPsi: positive, nominalIn: optional(nominalIn) });
export type Plug = z.output<typeof plug>;

/** A stretch of drain, waste or vent pipe between two elevations. */
export const pipe = strict({
  nominalIn,
  material: choice(pipeKinds),
  bottomFt: number,
  topFt: number,
  lengthFt: notNegative,
});
export type Pipe = z.output<typeof pipe>;

/** The laundry: its floor, the box outlet, and the drain branch a riser can stand on. */
export const laundry = strict({ floor: name, boxOutletFt: optional(number), branchFt: optional(number) });
export type Laundry = z.output<typeof laundry>;

export const floors = defaulted(list(floor, hydraulicLimits.floors), []);
export const materialList = defaulted(list(choice(materials), hydraulicLimits.materials), []);

/** A stretch of water line; its rating is that of the whole side. */
export const waterPipe = strict({
  material: choice(materials),
  nominalIn: z.literal([...waterSizesIn], {
    error: ({ input }) => (input === undefined ? 'required' : 'not-one-of-the-choices'),
  }),
  lengthFt: notNegative,
});
export type WaterPipe = z.output<typeof waterPipe>;
export const waterPipes = defaulted(list(waterPipe, hydraulicLimits.pipes), []);

/** The drain, waste and vent side of a house; what a method does not use may be left out. Elevations in feet above the finished first floor. */
export const dwvHouseShape = {
  floors,
  lowestFittingFt: optional(number),
  highestFittingFt: optional(number),
  /** The lowest open vent terminal; the others are capped for the test. */
  ventTerminalFt: optional(number),
  cappedVents: defaulted(count, 0),
  atticCutFt: optional(number),
  standpipeFt: optional(number),
  laundry: optional(laundry),
  pipeMaterial: optional(choice(materials)),
  plugs: defaulted(list(plug, hydraulicLimits.plugs), []),
  pipes: defaulted(list(pipe, hydraulicLimits.pipes), []),
};
