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

/** Lines of 3/4 in and 1/2 in, by their lengths. */
const waterLines = (material: 'pex' | 'copper', threeQuarterFt: number, halfFt: number) => [
  { material, nominalIn: 0.75 as const, lengthFt: threeQuarterFt },
  { material, nominalIn: 0.5 as const, lengthFt: halfFt },
];

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
  laundryTrapFt: 11.3,
  pipeMaterial: 'pvc',
  plugs: [{ name: 'building drain', elevationFt: -3, ratedPsi: 17, nominalIn: 4 }],
  pipes: [sch40(4, -3, -2.4, 30), sch40(3, -2.4, 24.5, 27), sch40(2, -1, 14, 62), sch40(1.5, 2, 19.5, 74)],
  gaugeFt: 3.5,
  highestOutletFt: 17,
  waterLowestFittingFt: -1.5,
  waterPipeMaterials: ['pex'],
  waterPipes: waterLines('pex', 90, 210),
  lowestRatedPsi: 126,
  supplyPsi: 62,
});

/** Two floors, laundry on the first: a riser can stand on its branch. */
const twoFloorsLaundryDown = house({
  ...twoFloorsLaundryUp,
  laundry: { floor: 'first', boxOutletFt: 3.5, branchFt: 0.9 },
  laundryTrapFt: 1.4,
  waterPipeMaterials: ['copper'],
  waterPipes: waterLines('copper', 90, 210),
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
  laundryTrapFt: 1.3,
  pipeMaterial: 'pvc',
  plugs: [{ name: 'building drain', elevationFt: -2.2, ratedPsi: 13, nominalIn: 4 }],
  pipes: [sch40(4, -2.2, -1.6, 40), sch40(3, -1.6, 15, 17), sch40(2, -1, 4, 48), sch40(1.5, 1, 10, 30)],
  gaugeFt: 2.5,
  highestOutletFt: 7,
  waterLowestFittingFt: -1,
  waterPipeMaterials: ['pex'],
  waterPipes: waterLines('pex', 60, 140),
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

/** The names their builders save them under. */
export const demoHouseNames: Readonly<Record<DemoHouse, string>> = {
  twoFloorsLaundryUp: 'Plan 2210',
  twoFloorsLaundryDown: 'Plan 2140',
  slab: 'Plan 1480',
  crawlSpace: 'Plan 1490',
  threeFloors: 'Plan 2760',
};

/** A next version, which the lots of the first have not been given yet. */
export const nextDemoVersions: Partial<Readonly<Record<DemoHouse, HouseGeometry>>> = {
  crawlSpace: house({ ...crawlSpace, highestOutletFt: 7.5, supplyPsi: 64 }),
};

/** Changed on one lot, by the address of the lot. */
export const demoHouseChanges: Readonly<Record<string, HouseGeometryGiven>> = {
  '418 Sedge Loop': { ventTerminalFt: 25.2 },
};
