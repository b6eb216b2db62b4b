import {
  houseGeometry,
  type HouseGeometry,
  type HouseGeometryGiven,
} from '@holdwater/shared-types/hydraulics/house-geometry.js';

const sch40 = (nominalIn: 1.5 | 2 | 3 | 4, bottomFt: number, topFt: number, lengthFt: number) => ({
  nominalIn,
  material: 'pvc-sch40' as const,
  bottomFt,
  topFt,
  lengthFt,
});

const house = (given: HouseGeometryGiven): HouseGeometry => houseGeometry.parse(given);

/** Two floors, laundry upstairs, vent cut in the attic possible. */
const twoFloorsLaundryUp = house({
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
    { name: 'attic', elevationFt: 19 },
  ],
  lowestFittingFt: -2.6,
  highestFittingFt: 13.5,
  ventTerminalFt: 24.5,
  cappedVents: 1,
  atticCutFt: 21,
  standpipeFt: 5,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  pipeMaterial: 'pvc',
  plugs: [{ name: 'building drain', elevationFt: -3, ratedPsi: 17, nominalIn: 4 }],
  pipes: [sch40(4, -3, -2.4, 30), sch40(3, -2.4, 24.5, 27), sch40(2, -1, 14, 62), sch40(1.5, 2, 19.5, 74)],
  gaugeFt: 3.5,
  highestOutletFt: 17,
  waterLowestFittingFt: -1.5,
  waterPipeMaterials: ['pex'],
  lowestRatedPsi: 126,
  supplyPsi: 62,
});

/** Two floors, laundry on the first: a riser can stand on its branch. */
const twoFloorsLaundryDown = house({
  ...twoFloorsLaundryUp,
  laundry: { floor: 'first', boxOutletFt: 3.5, branchFt: 0.9 },
  waterPipeMaterials: ['copper'],
  lowestRatedPsi: 150,
  lowestRatedAirPsi: 80,
});

/** One floor on a slab. */
const slab = house({
  floors: [{ name: 'first', elevationFt: 0 }],
  lowestFittingFt: -2,
  highestFittingFt: 3.5,
  ventTerminalFt: 15,
  cappedVents: 0,
  atticCutFt: 11,
  standpipeFt: 10,
  laundry: { floor: 'first', boxOutletFt: 3.5, branchFt: 0.8 },
  pipeMaterial: 'pvc',
  plugs: [{ name: 'building drain', elevationFt: -2.2, ratedPsi: 13, nominalIn: 4 }],
  pipes: [sch40(4, -2.2, -1.6, 40), sch40(3, -1.6, 15, 17), sch40(2, -1, 4, 48), sch40(1.5, 1, 10, 30)],
  gaugeFt: 2.5,
  highestOutletFt: 7,
  waterLowestFittingFt: -1,
  waterPipeMaterials: ['pex'],
  lowestRatedPsi: 160,
  supplyPsi: 70,
});

/** One floor over a crawl space. */
const crawlSpace = house({
  ...slab,
  lowestFittingFt: -3.5,
  plugs: [{ name: 'building drain', elevationFt: -3.8, ratedPsi: 13, nominalIn: 3 }],
});

/** Three floors. */
const threeFloors = house({
  ...twoFloorsLaundryUp,
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
    { name: 'third', elevationFt: 20 },
  ],
  highestFittingFt: 23.5,
  ventTerminalFt: 34,
  atticCutFt: 31,
  highestOutletFt: 27,
});

export const demoHouses = { twoFloorsLaundryUp, twoFloorsLaundryDown, slab, crawlSpace, threeFloors } as const;
export type DemoHouse = keyof typeof demoHouses;
