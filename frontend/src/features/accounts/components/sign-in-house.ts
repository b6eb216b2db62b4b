import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';

/** The house on the sign-in sheet: invented, two floors, filled through the attic cut. Feet above the finished first floor. */
export const signInHouse = houseGeometry.parse({
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -3,
  highestFittingFt: 13.5,
  ventTerminalFt: 24.5,
  atticCutFt: 21,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  pipeMaterial: 'pvc',
  plugs: [{ name: 'test plug', elevationFt: -3, ratedPsi: 17, nominalIn: 4 }],
  pipes: [{ nominalIn: 3, material: 'pvc-sch40', bottomFt: -3, topFt: 24.5, lengthFt: 27.5 }],
});
