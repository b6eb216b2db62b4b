import fc from 'fast-check';
import { dwvMethods, materials, type DwvRequest, type Floor } from '../second/dwv.input.js';
import { nominalSizes } from '../second/physics.js';
import { elevationFt, feet, floorsWithin, maybe, orAbsent, psi, waterTempF } from './measures.js';

interface House {
  lowestFittingFt: number;
  highestFittingFt: number;
  ventTerminalFt: number;
}

/** Heights that may also all be the same. */
const house: fc.Arbitrary<House> = fc
  .tuple(feet(-12, 2), fc.oneof(fc.constant(0), feet(0, 30)), fc.oneof(fc.constant(0), feet(0, 25)))
  .map(([lowestFittingFt, rise, over]) => {
    const highestFittingFt = lowestFittingFt + rise;
    return { lowestFittingFt, highestFittingFt, ventTerminalFt: highestFittingFt + over };
  });

const nominalIn = fc.constantFrom(...nominalSizes);
const plugNames = ['building drain', 'clean-out', 'branch', 'stack tee'];
const plugs = fc
  .array(fc.record({ elevationFt: feet(-14, 40), ratedPsi: psi(1, 40), nominalIn: maybe(nominalIn) }), {
    maxLength: plugNames.length,
  })
  .map((list) => list.map((plug, index) => ({ name: plugNames[index] ?? '', ...plug })));

const pipe = fc
  .record({
    nominalIn,
    material: fc.constantFrom('pvc-sch40', 'abs-sch40'),
    bottomFt: feet(-14, 45),
    rise: fc.oneof(fc.constant(0), feet(0, 30)),
    slack: feet(0, 12),
  })
  .map(({ rise, slack, ...given }) => ({ ...given, topFt: given.bottomFt + rise, lengthFt: rise + slack }));

const headRule = fc.oneof(
  // 10 and 5 ft, and two odd local heads of check-values.md: 42 in and 6 ft
  fc
    .oneof(fc.constantFrom(10, 5, 3.5, 6, 0), feet(0, 15))
    .map((over) => ({ kind: 'above-highest-fitting' as const, feet: over })),
  fc.constant({ kind: 'fill-level' as const }),
);

const common = fc.record({
  cappedVents: orAbsent(fc.integer({ min: 0, max: 3 })),
  method: fc.constantFrom(...dwvMethods),
  pipeMaterial: fc.constantFrom(...materials),
  rule: fc.record({
    acceptedMethods: fc.oneof(fc.constant(dwvMethods), fc.subarray(dwvMethods)),
    headRule,
    airOnPlastic: orAbsent(fc.boolean()),
  }),
  makersAllowAir: orAbsent(fc.boolean()),
  plugs: orAbsent(plugs),
  pipes: orAbsent(fc.array(pipe, { maxLength: 5 })),
  fillRateGpm: maybe(fc.integer({ min: 1, max: 60 }).map((n) => n / 4)),
  waterTempF,
  elevationFt,
});

/** What single methods use; each is there whenever its method is chosen, and sometimes when it is not. */
function ownOf(from: House, floors: Floor[], base: { method: string; rule: DwvRequest['rule'] }) {
  const { lowestFittingFt: low, ventTerminalFt: vent } = from;
  // twentieths of the way up, where a tape would read it, and the terminal itself
  const share = fc.integer({ min: 0, max: 20 }).map((n) => low + ((vent - low) * n) / 20);
  const level = fc.oneof(share, share, feet(low, low + 40), fc.constant(vent)).map((at) => Math.min(at, vent));
  const lap = base.rule.headRule.kind === 'above-highest-fitting' ? base.rule.headRule.feet : 10;
  const usedBy = <T>(methods: string[], arbitrary: fc.Arbitrary<T>): fc.Arbitrary<T | null | undefined> =>
    methods.includes(base.method) ? arbitrary : maybe(arbitrary);
  // the branch as high as the level, and a riser that fits over it: 18 in by itself wherever there is room for it
  const laundry = fc
    .record({
      floor: fc.nat(),
      boxOutletFt: level,
      branchFt: level,
      riserIn: orAbsent(fc.integer({ min: 0, max: 60 })),
    })
    .map(({ floor, riserIn, boxOutletFt, branchFt }) => {
      const name = floors[floor % floors.length]?.name ?? '';
      const roomIn = (vent - branchFt) * 12;
      const fits = (riserIn ?? 18) <= roomIn;
      return { laundry: { floor: name, boxOutletFt, branchFt }, riserIn: fits ? riserIn : Math.floor(roomIn) };
    });
  return fc
    .record({
      atticCutFt: usedBy(['attic-cut'], level),
      standpipeFt: usedBy(['standpipe'], level),
      airPsi: usedBy(['air'], psi(1, 12)),
      airVolumeGal: usedBy(
        ['air'],
        fc.integer({ min: 0, max: 400 }).map((n) => n / 4),
      ),
      maxSectionFt: usedBy(
        ['sectional'],
        feet(1, 30).map((over) => lap + over),
      ),
      wash: floors.length === 0 ? fc.constant({}) : laundry,
    })
    .map(({ wash, ...own }) => ({ ...own, ...wash }));
}

/** Any valid request of a DWV plan. */
export const dwvInputs: fc.Arbitrary<DwvRequest> = fc
  .tuple(house, common)
  .chain(([from, base]) =>
    fc.tuple(
      fc.constant(from),
      fc.constant(base),
      floorsWithin(from.lowestFittingFt - 2, from.ventTerminalFt + 4, base.method.startsWith('laundry') ? 1 : 0),
    ),
  )
  .chain(([from, base, floors]) => ownOf(from, floors, base).map((own) => ({ ...from, ...base, floors, ...own })));
