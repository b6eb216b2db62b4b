import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { type HouseGeometryGiven, houseGeometry } from '../hydraulics/house-geometry.js';
import { issueCodes } from '../hydraulics/issue-codes.js';
import { houseIssueCodes, houseToSave } from './house.rules.js';

const house = {
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -2,
  highestFittingFt: 13.5,
  ventTerminalFt: 26,
  atticCutFt: 21,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  laundryTrapFt: 11.5,
  plugs: [{ name: 'building drain', elevationFt: -2, ratedPsi: 17, nominalIn: 4 as const }],
  pipes: [{ nominalIn: 3 as const, material: 'pvc-sch40' as const, bottomFt: -2, topFt: 26, lengthFt: 28 }],
  waterPipeMaterials: ['pex' as const],
  waterPipes: [{ material: 'pex' as const, nominalIn: 0.75 as const, lengthFt: 120 }],
} satisfies HouseGeometryGiven;

const refusals = (given: unknown): Record<string, string> =>
  Object.fromEntries(
    (houseToSave.safeParse(given).error?.issues ?? []).map((issue) => [issue.path.join('.'), issue.message]),
  );

describe('a house to be saved', () => {
  it('is kept as it is when nothing speaks against it, and so is one nobody measured', () => {
    expect(houseToSave.parse(house)).toEqual(houseGeometry.parse(house));
    expect(refusals({})).toEqual({});
  });

  it.each<[string, object, Record<string, string>]>([
    [
      'its highest fitting above the vent terminal',
      { highestFittingFt: 26.1, atticCutFt: null },
      { highestFittingFt: 'level-above-vent-terminal' },
    ],
    ['a cut above the roof', { atticCutFt: 26.1 }, { atticCutFt: 'level-above-vent-terminal' }],
    ['a cut below its highest fitting', { atticCutFt: 13.4 }, { atticCutFt: 'below-highest-fitting' }],
    [
      'a floor twice',
      { floors: [...house.floors, { name: 'first', elevationFt: 20 }] },
      { 'floors.2.name': 'floor-named-twice' },
    ],
    [
      'a floor twice but for case and blanks',
      { floors: [...house.floors, { name: ' Second', elevationFt: 20 }] },
      { 'floors.2.name': 'floor-named-twice' },
    ],
    ['floors out of order', { floors: [...house.floors].reverse() }, { 'floors.1.elevationFt': 'floor-out-of-order' }],
    [
      'two floors at one height',
      { floors: [...house.floors, { name: 'third', elevationFt: 10 }] },
      { 'floors.2.elevationFt': 'floor-out-of-order' },
    ],
    [
      'a plug with no size',
      { plugs: [{ ...house.plugs[0], nominalIn: null }] },
      { 'plugs.0.nominalIn': 'size-missing' },
    ],
    [
      'a plug rated for nothing',
      { plugs: [{ ...house.plugs[0], ratedPsi: 0 }] },
      { 'plugs.0.ratedPsi': 'must-be-positive' },
    ],
    ['a rating of zero', { lowestRatedPsi: 0 }, { lowestRatedPsi: 'must-be-positive' }],
    [
      'a pipe shorter than its rise',
      { pipes: [{ ...house.pipes[0], lengthFt: 27.9 }] },
      { 'pipes.0.lengthFt': 'shorter-than-its-rise' },
    ],
    [
      'a branch above the laundry box',
      { laundry: { ...house.laundry, branchFt: 13.6 }, laundryTrapFt: null },
      { 'laundry.branchFt': 'branch-above-box' },
    ],
    ['a trap above the laundry box', { laundryTrapFt: 13.6 }, { laundryTrapFt: 'trap-above-box' }],
    ['a trap below its branch', { laundryTrapFt: 10.7 }, { laundryTrapFt: 'trap-below-branch' }],
    ['a trap without a laundry', { laundry: null }, { laundryTrapFt: 'no-laundry' }],
    [
      'a water line of a material its list leaves out',
      { waterPipes: [{ material: 'copper', nominalIn: 0.5, lengthFt: 3 }] },
      { 'waterPipes.0.material': 'material-not-listed' },
    ],
    [
      'a water line of a size that is not made',
      { waterPipes: [{ material: 'pex', nominalIn: 0.6, lengthFt: 3 }] },
      { 'waterPipes.0.nominalIn': 'not-one-of-the-choices' },
    ],
  ])('is refused with %s, at its field', (_what, wrong, expected) => {
    expect(refusals({ ...house, ...wrong })).toEqual(expected);
    const known: readonly string[] = [...issueCodes, ...houseIssueCodes];
    for (const code of Object.values(expected)) expect(known).toContain(code);
  });

  it('takes floors in exactly the orders in which they go up', () => {
    const heights = fc.uniqueArray(fc.integer({ min: -200, max: 400 }), { minLength: 2, maxLength: 20 });
    fc.assert(
      fc.property(heights, (unsorted) => {
        const floors = unsorted.map((tenths) => ({ name: `at ${tenths}`, elevationFt: tenths / 10 }));
        const isGoingUp = unsorted.every((tenths, index) => index === 0 || tenths > (unsorted[index - 1] ?? tenths));
        expect(Object.keys(refusals({ floors })).length === 0).toBe(isGoingUp);
        const sorted = [...floors].sort((a, b) => a.elevationFt - b.elevationFt);
        expect(refusals({ floors: sorted })).toEqual({});
      }),
    );
  });

  it('takes cut, highest fitting and vent terminal in exactly the order they have on a house', () => {
    const feet = fc.integer({ min: -100, max: 600 }).map((tenths) => tenths / 10);
    fc.assert(
      fc.property(feet, feet, feet, (highestFittingFt, atticCutFt, ventTerminalFt) => {
        const isPossible = highestFittingFt <= atticCutFt && atticCutFt <= ventTerminalFt;
        expect(houseToSave.safeParse({ highestFittingFt, atticCutFt, ventTerminalFt }).success).toBe(isPossible);
      }),
    );
  });

  it('can be written as JSON schema', () => {
    expect(Object.keys(z.toJSONSchema(houseToSave, { io: 'input' }).properties ?? {})).toContain('waterPipes');
  });
});
