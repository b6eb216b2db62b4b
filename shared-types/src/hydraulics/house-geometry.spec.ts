import { describe, expect, expectTypeOf, it } from 'vitest';
import { z } from 'zod';
import { emptyHouse, houseGeometry, type HouseGeometry, type HouseGeometryGiven } from './house-geometry.js';
import { issueCodes } from './issue-codes.js';

const house = {
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -2,
  highestFittingFt: 13.5,
  ventTerminalFt: 26,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  plugs: [{ name: 'building drain', elevationFt: -2, ratedPsi: 17, nominalIn: 4 as const }],
  pipes: [{ nominalIn: 3 as const, material: 'pvc-sch40' as const, bottomFt: -2, topFt: 26, lengthFt: 28 }],
};

const refusals = (given: unknown): Record<string, string> =>
  Object.fromEntries(
    (houseGeometry.safeParse(given).error?.issues ?? []).map((issue) => [issue.path.join('.'), issue.message]),
  );

describe('house geometry', () => {
  it('keeps what is given and reads what is left out, or null, as absent', () => {
    const parsed = houseGeometry.parse({ ...house, cappedVents: null, plugs: null, gaugeFt: null });
    expect(parsed).toMatchObject({ floors: house.floors, cappedVents: 0, plugs: [], gaugeFt: null, atticCutFt: null });
    expect(parsed.laundry).toEqual({ floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 });
    expect(houseGeometry.parse(parsed)).toEqual(parsed);
  });

  it('needs nothing for an empty house, in types too', () => {
    expect(emptyHouse()).toMatchObject({ floors: [], pipes: [], ventTerminalFt: null });
    expectTypeOf<Record<string, never>>().toExtend<HouseGeometryGiven>();
    expectTypeOf<HouseGeometry['cappedVents']>().toEqualTypeOf<number>();
    expectTypeOf<HouseGeometry['plugs'][number]['nominalIn']>().toEqualTypeOf<1.25 | 1.5 | 2 | 3 | 4 | 6 | null>();
  });

  it.each<[string, unknown, Record<string, string>]>([
    ['an unknown key', { ...house, roof: 1 }, { '': 'unknown' }],
    ['an unknown key further in', { ...house, plugs: [{ ...house.plugs[0], color: 'red' }] }, { 'plugs.0': 'unknown' }],
    [
      'a rating of zero',
      { ...house, plugs: [{ ...house.plugs[0], ratedPsi: 0 }] },
      { 'plugs.0.ratedPsi': 'must-be-positive' },
    ],
    ['a missing rating', { ...house, plugs: [{ name: 'a', elevationFt: 0 }] }, { 'plugs.0.ratedPsi': 'required' }],
    ['NaN', { ...house, lowestFittingFt: Number.NaN }, { lowestFittingFt: 'must-be-a-number' }],
    ['infinity', { ...house, ventTerminalFt: Infinity }, { ventTerminalFt: 'must-be-a-number' }],
    [
      'a negative length',
      { ...house, pipes: [{ ...house.pipes[0], lengthFt: -1 }] },
      { 'pipes.0.lengthFt': 'must-not-be-negative' },
    ],
    [
      'a size that is not made',
      { ...house, pipes: [{ ...house.pipes[0], nominalIn: 5 }] },
      { 'pipes.0.nominalIn': 'not-one-of-the-choices' },
    ],
    [
      'a pipe upside down',
      { ...house, pipes: [{ ...house.pipes[0], bottomFt: 27 }] },
      { 'pipes.0.bottomFt': 'bottom-above-top' },
    ],
    [
      'a floor named twice',
      { ...house, floors: [...house.floors, { name: 'first', elevationFt: 20 }] },
      { 'floors.2.name': 'floor-named-twice' },
    ],
    ['a laundry on no floor', { ...house, laundry: { floor: 'attic' } }, { 'laundry.floor': 'floor-unknown' }],
    ['lowest above highest', { ...house, lowestFittingFt: 14 }, { lowestFittingFt: 'lowest-above-highest' }],
    [
      'lowest above highest on the water side',
      { waterLowestFittingFt: 2, highestOutletFt: 1 },
      { waterLowestFittingFt: 'lowest-above-highest' },
    ],
    ['a cut above the vent terminal', { ...house, atticCutFt: 26.1 }, { atticCutFt: 'level-above-vent-terminal' }],
    ['half a vent', { ...house, cappedVents: 0.5 }, { cappedVents: 'must-be-a-whole-number' }],
    [
      '21 floors',
      { floors: Array.from({ length: 21 }, (_, n) => ({ name: `f${n}`, elevationFt: n })) },
      { floors: 'too-many' },
    ],
    ['201 pipes', { pipes: Array.from({ length: 201 }, () => house.pipes[0]) }, { pipes: 'too-many' }],
    ['no object', 'a house', { '': 'must-be-an-object' }],
  ])('refuses %s', (_, given, expected) => {
    expect(refusals(given)).toEqual(expected);
    for (const code of Object.values(expected)) expect(issueCodes).toContain(code);
  });

  it('allows equal ends', () => {
    expect(
      refusals({
        lowestFittingFt: 1,
        highestFittingFt: 1,
        ventTerminalFt: 1,
        atticCutFt: 1,
        pipes: [{ ...house.pipes[0], bottomFt: 26 }],
      }),
    ).toEqual({});
  });

  it('can be written as JSON schema, given and answered', () => {
    for (const io of ['input', 'output'] as const) {
      const schema = z.toJSONSchema(houseGeometry, { io });
      expect(Object.keys(schema.properties ?? {})).toContain('ventTerminalFt');
    }
    expect(z.toJSONSchema(houseGeometry, { io: 'input' }).required ?? []).toEqual([]);
  });
});
