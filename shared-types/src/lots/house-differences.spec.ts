import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { emptyHouse, houseGeometry, type HouseGeometry } from '../hydraulics/house-geometry.js';
import { differingParts, houseParts, keepOwnChanges } from './house-differences.js';

const feet = fc.option(
  fc.integer({ min: -100, max: 600 }).map((tenths) => tenths / 10),
  { nil: null },
);
const houses: fc.Arbitrary<HouseGeometry> = fc
  .record({
    ...{ lowestFittingFt: feet, atticCutFt: feet, gaugeFt: feet, standpipeFt: feet },
    cappedVents: fc.integer({ min: 0, max: 5 }),
    waterPipeMaterials: fc.subarray(['pex', 'copper', 'cpvc'] as const),
    floors: fc
      .uniqueArray(fc.integer({ min: 0, max: 30 }), { maxLength: 3 })
      .map((all) => all.map((elevationFt) => ({ name: `at ${elevationFt}`, elevationFt }))),
  })
  .map((some) => ({ ...emptyHouse(), ...some }));

describe('what two houses differ in', () => {
  it('is nothing for one and the same, whatever the order of its keys and with parts left out', () => {
    fc.assert(
      fc.property(houses, (house) => {
        const turned = Object.fromEntries(Object.entries(house).reverse()) as HouseGeometry;
        expect(differingParts(house, turned)).toEqual([]);
      }),
    );
    const { waterPipes: _left, laundryTrapFt: _out, ...earlier } = emptyHouse();
    expect(differingParts(earlier as HouseGeometry, emptyHouse())).toEqual([]);
  });

  it('is the one part that was changed', () => {
    const changed = houseGeometry.parse({ floors: [{ name: 'first', elevationFt: 0 }] });
    expect(differingParts(emptyHouse(), changed)).toEqual(['floors']);
    expect(houseParts).toContain('waterPipes');
  });

  it('is the same both ways', () => {
    fc.assert(
      fc.property(houses, houses, (a, b) => {
        expect(differingParts(a, b)).toEqual(differingParts(b, a));
      }),
    );
  });
});

describe('own changes carried over to the next version', () => {
  it('are the next version where nothing was changed, and the own house where the version is the same', () => {
    fc.assert(
      fc.property(houses, houses, (base, next) => {
        expect(keepOwnChanges(base, base, next)).toEqual(next);
        expect(keepOwnChanges(base, next, base)).toEqual(next);
      }),
    );
  });

  it('stay as they are, all else becomes what the next version has', () => {
    fc.assert(
      fc.property(houses, houses, houses, (base, own, next) => {
        const carried = keepOwnChanges(base, own, next);
        const kept = differingParts(base, own);
        for (const part of houseParts) expect(carried[part]).toEqual(kept.includes(part) ? own[part] : next[part]);
      }),
    );
  });
});
