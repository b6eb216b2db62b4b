import type { DwvPlanGiven } from './dwv-plan.contract.js';

/** A two-floor house of PVC, laundry upstairs, filled from a cut in the attic: the worked example that the checks start from. */
export const dwvSample: DwvPlanGiven = {
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -2,
  highestFittingFt: 13.5,
  ventTerminalFt: 26,
  cappedVents: 1,
  atticCutFt: 20.5,
  standpipeFt: 10,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  method: 'attic-cut',
  riserIn: 18,
  airPsi: 5,
  airVolumeGal: 30,
  maxSectionFt: 30,
  pipeMaterial: 'pvc',
  rule: {
    acceptedMethods: ['stack-to-roof', 'attic-cut'],
    headRule: { kind: 'above-highest-fitting', feet: 10 },
    airOnPlastic: false,
  },
  makersAllowAir: false,
  plugs: [{ name: 'building drain', elevationFt: -2, ratedPsi: 17, nominalIn: 4 }],
  pipes: [{ nominalIn: 3, material: 'pvc-sch40', bottomFt: -2, topFt: 26, lengthFt: 28 }],
  fillRateGpm: 6,
  waterTempF: 60,
  elevationFt: 850,
};
