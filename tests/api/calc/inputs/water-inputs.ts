import fc from 'fast-check';
import { materials } from '../second/dwv.input.js';
import { media, type IncrementRow, type Medium, type WaterRequest } from '../second/water.input.js';
import { secondWaterPlan } from '../second/water.js';
import { elevationFt, feet, floorsWithin, increment, maybe, orAbsent, psi, waterTempF } from './measures.js';

/** A table of a rule card: thresholds that rise, with or without a percentage at the end. */
const gaugeIncrements: fc.Arbitrary<IncrementRow[]> = fc
  .tuple(
    fc.uniqueArray(fc.integer({ min: 5, max: 160 }), { minLength: 1, maxLength: 3 }),
    fc.array(increment, { minLength: 3, maxLength: 3 }),
    fc.option(fc.integer({ min: 1, max: 5 })),
  )
  .map(([limits, steps, percent]) => {
    const rows = limits.sort((a, b) => a - b).map((upToPsi, n) => ({ upToPsi, incrementPsi: steps[n] ?? 1 }));
    return percent === null ? rows : [...rows, { percent }];
  });

const rule = fc.record({
  // the edges of the gauge table (10 and 100 psi, IRC P2503.9) more often than chance would have them
  minimumPsi: fc.oneof(fc.constantFrom(5, 10, 50, 100, 150), psi(3, 200)),
  preferredPsi: maybe(psi(3, 220)),
  measuredAt: orAbsent(fc.constantFrom('gauge' as const, 'highest-outlet' as const)),
  media: fc.oneof(
    { weight: 2, arbitrary: fc.constant<Medium[]>([...media]) },
    { weight: 1, arbitrary: fc.subarray([...media]) },
  ),
  airOnPlastic: orAbsent(fc.boolean()),
  gaugeIncrements: maybe(gaugeIncrements),
});

const request: fc.Arbitrary<WaterRequest> = fc
  .record({
    gaugeFt: feet(-6, 30),
    lowestFittingFt: feet(-8, 2),
    rise: fc.oneof(fc.constant(0), feet(0, 35)),
    floors: orAbsent(floorsWithin(-8, 30)),
    medium: fc.constantFrom(...media),
    pipeMaterials: fc.oneof(
      fc.constantFrom('copper' as const, 'pex' as const).map((only) => [only]),
      fc.uniqueArray(fc.constantFrom(...materials), { maxLength: 3 }),
    ),
    makersAllowAir: orAbsent(fc.boolean()),
    airVolumeGal: maybe(fc.integer({ min: 0, max: 80 }).map((n) => n / 4)),
    rule,
    lowestRatedPsi: fc.oneof(psi(20, 400), psi(160, 300)),
    lowestRatedAirPsi: maybe(fc.oneof(psi(20, 400), psi(120, 300))),
    supplyPsi: maybe(psi(20, 120)),
    gauge: fc.record({ rangePsi: fc.constantFrom(15, 60, 100, 160, 200, 300, 300, 400), incrementPsi: increment }),
    waterTempF,
    elevationFt,
  })
  .map(({ rise, ...given }) => ({ ...given, highestOutletFt: given.lowestFittingFt + rise }));

/** Any valid request of a water plan in which every place named is under pressure: the design leaves open what a lower one reads. */
export const waterInputs = request.filter((given) =>
  secondWaterPlan(given).levels.every(({ pressurePsi }) => pressurePsi >= 0),
);
