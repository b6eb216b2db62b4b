import { type z } from 'zod';
import { notNegative, number, optional, positive, siteElevationFt, strict } from './field-kinds.js';
import { dwvHouseShape, materialList, waterPipes } from './house-fields.js';
import {
  refuseAbove,
  refuseFloorsNamedTwice,
  refuseIn,
  refusePipesUpsideDown,
  refuseUnknownLaundryFloor,
  type Refuse,
} from './house-refusals.js';

/** A house (or one unit of it) as it is stored with the lot; what nobody measured yet is null. Elevations in feet above the finished first floor. */
const storedHouse = strict({
  ...dwvHouseShape,
  /** Site above sea level; null leaves it to the department's elevation. */
  elevationFt: optional(siteElevationFt),
  /** The outlet of the laundry's trap. */
  laundryTrapFt: optional(number),
  /** The water side: where the gauge sits, and the ends of the lines. */
  gaugeFt: optional(number),
  highestOutletFt: optional(number),
  waterLowestFittingFt: optional(number),
  waterPipeMaterials: materialList,
  waterPipes,
  lowestRatedPsi: optional(positive),
  lowestRatedAirPsi: optional(positive),
  supplyPsi: optional(notNegative),
});

export const houseGeometry = storedHouse.superRefine((house, ctx) => refuseImpossibleHouse(house, refuseIn(ctx)));
export type HouseGeometry = z.output<typeof houseGeometry>;
export type HouseGeometryGiven = z.input<typeof houseGeometry>;

/** A house of which nothing is known yet. */
export const emptyHouse = (): HouseGeometry => houseGeometry.parse({});

function refuseImpossibleHouse(house: z.output<typeof storedHouse>, refuse: Refuse): void {
  const vent = house.ventTerminalFt;
  refuseFloorsNamedTwice(house.floors, refuse);
  refusePipesUpsideDown(house.pipes, refuse);
  refuseAbove(house.lowestFittingFt, house.highestFittingFt, ['lowestFittingFt'], 'lowest-above-highest', refuse);
  refuseAbove(
    house.waterLowestFittingFt,
    house.highestOutletFt,
    ['waterLowestFittingFt'],
    'lowest-above-highest',
    refuse,
  );
  refuseAbove(house.lowestFittingFt, vent, ['ventTerminalFt'], 'ends-before-it-starts', refuse);
  refuseAbove(house.atticCutFt, vent, ['atticCutFt'], 'level-above-vent-terminal', refuse);
  refuseAbove(house.standpipeFt, vent, ['standpipeFt'], 'level-above-vent-terminal', refuse);
  if (house.laundry === null) return;
  refuseUnknownLaundryFloor(house.laundry, house.floors, refuse);
  refuseAbove(house.laundry.boxOutletFt, vent, ['laundry', 'boxOutletFt'], 'level-above-vent-terminal', refuse);
  refuseAbove(house.laundry.branchFt, vent, ['laundry', 'branchFt'], 'level-above-vent-terminal', refuse);
}
