import type { DwvRequest } from '../second/dwv.input.js';
import type { HoldRequest } from '../second/hold.input.js';
import type { LevelRequest } from '../second/level-log.js';
import type { WaterRequest } from '../second/water.input.js';

/** The design's own examples, each accepted as it stands. */
export const dwvSample = {
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
} satisfies DwvRequest;

export const waterSample = {
  gaugeFt: 3.5,
  highestOutletFt: 17,
  lowestFittingFt: -1.5,
  floors: [{ name: 'first', elevationFt: 0 }],
  medium: 'water-topped-with-air',
  pipeMaterials: ['copper'],
  makersAllowAir: false,
  airVolumeGal: 1.5,
  rule: {
    minimumPsi: 100,
    preferredPsi: 120,
    measuredAt: 'gauge',
    media: ['water', 'water-topped-with-air'],
    airOnPlastic: false,
    gaugeIncrements: [{ upToPsi: 10, incrementPsi: 0.1 }, { percent: 2 }],
  },
  lowestRatedPsi: 150,
  lowestRatedAirPsi: 125,
  supplyPsi: 62,
  gauge: { rangePsi: 200, incrementPsi: 1 },
  waterTempF: 60,
} satisfies WaterRequest;

export const holdSample = {
  medium: 'water',
  elevationFt: 850,
  minimumPsi: 100,
  ceilingPsi: 146,
  holdMinutes: 15,
  settleMinutes: 60,
  plastic: true,
  gauge: { incrementPsi: 1 },
  readings: [
    { at: '2027-03-02T15:00:00Z', psi: 120, temperatureF: 68, gaugeValve: 'open' },
    { at: '2027-03-02T17:00:00Z', psi: 119, temperatureF: 66, gaugeValve: 'open' },
  ],
  forecast: {
    from: '2027-03-03T14:00:00Z',
    to: '2027-03-03T16:00:00Z',
    temperatureF: 41,
    coldestF: 28,
    hottestF: 70,
  },
} satisfies HoldRequest;

export const levelSample = {
  readings: [
    { at: '2027-03-02T15:00:00Z', levelIn: 0.5 },
    { at: '2027-03-02T15:20:00Z', levelIn: 0.5 },
  ],
  gauge: { incrementIn: 0.125 },
  maximumFallIn: 0.5,
  holdMinutes: 15,
} satisfies LevelRequest;

export const dialSample = {
  center: { x: 500, y: 500 },
  zeroMark: { x: 300, y: 700 },
  fullMark: { x: 700, y: 700 },
  needleTip: { x: 500, y: 200 },
  rangePsi: 200,
  typedPsi: 101,
  incrementPsi: 2,
};
