import { describe, expect, it } from 'vitest';
import { dwvMethods } from '../holds/hold.states.js';
import { dwvPlanInput } from './dwv-plan.contract.js';
import { dwvSample } from './dwv-plan.sample.js';
import { issueCodes } from './issue-codes.js';

const refusals = (given: unknown): Record<string, string> =>
  Object.fromEntries(
    (dwvPlanInput.safeParse(given).error?.issues ?? []).map((issue) => [issue.path.join('.'), issue.message]),
  );
const [plug] = dwvSample.plugs ?? [];
const [pipe] = dwvSample.pipes ?? [];
const { rule } = dwvSample;

describe('bad input of a DWV plan', () => {
  it('is none in the worked example, by any method', () => {
    for (const method of dwvMethods) expect(refusals({ ...dwvSample, method })).toEqual({});
  });

  it.each<[string, Record<string, unknown>, Record<string, string>]>([
    ['an unknown key', { roofFt: 1 }, { '': 'unknown' }],
    ['an unknown key in the rule', { rule: { ...rule, code: 1 } }, { rule: 'unknown' }],
    ['an unknown method', { method: 'hope' }, { method: 'not-one-of-the-choices' }],
    ['no method', { method: undefined }, { method: 'required' }],
    ['a null method', { method: null }, { method: 'not-one-of-the-choices' }],
    ['NaN', { highestFittingFt: Number.NaN }, { highestFittingFt: 'must-be-a-number' }],
    ['a number in words', { lowestFittingFt: '-2' }, { lowestFittingFt: 'must-be-a-number' }],
    ['a rating of zero', { plugs: [{ ...plug, ratedPsi: 0 }] }, { 'plugs.0.ratedPsi': 'must-be-positive' }],
    ['a negative rating', { plugs: [plug, { ...plug, ratedPsi: -4 }] }, { 'plugs.1.ratedPsi': 'must-be-positive' }],
    ['a rate of zero', { fillRateGpm: 0 }, { fillRateGpm: 'must-be-positive' }],
    ['a negative riser', { riserIn: -1 }, { riserIn: 'must-not-be-negative' }],
    [
      'negative feet',
      { rule: { ...rule, headRule: { kind: 'above-highest-fitting', feet: -1 } } },
      { 'rule.headRule.feet': 'must-not-be-negative' },
    ],
    [
      'a head rule without feet',
      { rule: { ...rule, headRule: { kind: 'above-highest-fitting' } } },
      { 'rule.headRule.feet': 'required' },
    ],
    [
      'a head rule of no kind',
      { rule: { ...rule, headRule: { kind: 'high', feet: 1 } } },
      { 'rule.headRule.kind': 'not-one-of-the-choices' },
    ],
    ['no head rule', { rule: { acceptedMethods: ['attic-cut'] } }, { 'rule.headRule': 'required' }],
    ['negative vents', { cappedVents: -1 }, { cappedVents: 'must-not-be-negative' }],
    ['water as ice', { waterTempF: 31 }, { waterTempF: 'water-temperature-out-of-range' }],
    ['water as steam', { waterTempF: 213 }, { waterTempF: 'water-temperature-out-of-range' }],
    [
      'a floor named twice',
      {
        floors: [
          { name: 'a', elevationFt: 0 },
          { name: 'a', elevationFt: 9 },
        ],
      },
      { 'floors.1.name': 'floor-named-twice' },
    ],
    ['lowest above highest', { lowestFittingFt: 14 }, { lowestFittingFt: 'lowest-above-highest' }],
    ['a pipe upside down', { pipes: [{ ...pipe, topFt: -3 }] }, { 'pipes.0.bottomFt': 'bottom-above-top' }],
    ['a pipe of no kind', { pipes: [{ ...pipe, material: 'pex' }] }, { 'pipes.0.material': 'not-one-of-the-choices' }],
    ['no vent terminal', { ventTerminalFt: null }, { ventTerminalFt: 'required' }],
    ['no attic cut', { atticCutFt: null }, { atticCutFt: 'required' }],
    ['a cut above the vent terminal', { atticCutFt: 27 }, { atticCutFt: 'level-above-vent-terminal' }],
    [
      'a box above it',
      { method: 'laundry-box', laundry: { floor: 'second', boxOutletFt: 27 } },
      { 'laundry.boxOutletFt': 'level-above-vent-terminal' },
    ],
    [
      'a riser above it',
      { method: 'laundry-riser', laundry: { floor: 'first', branchFt: 25 } },
      { 'laundry.branchFt': 'level-above-vent-terminal' },
    ],
    ['a standpipe above it', { method: 'standpipe', standpipeFt: 27 }, { standpipeFt: 'level-above-vent-terminal' }],
    ['no standpipe', { method: 'standpipe', standpipeFt: null }, { standpipeFt: 'required' }],
    ['no laundry', { method: 'laundry-box', laundry: null }, { laundry: 'required' }],
    ['no box', { method: 'laundry-box', laundry: { floor: 'second' } }, { 'laundry.boxOutletFt': 'required' }],
    ['no branch', { method: 'laundry-riser', laundry: { floor: 'first' } }, { 'laundry.branchFt': 'required' }],
    [
      'a laundry on no floor',
      { method: 'laundry-box', laundry: { floor: 'loft', boxOutletFt: 3 } },
      { 'laundry.floor': 'floor-unknown' },
    ],
    ['no section height', { method: 'sectional', maxSectionFt: null }, { maxSectionFt: 'required' }],
    [
      'feet as high as a section',
      { method: 'sectional', maxSectionFt: 10 },
      { maxSectionFt: 'overlap-not-below-section' },
    ],
    ['sections without number', { method: 'sectional', maxSectionFt: 10.001 }, { maxSectionFt: 'too-many-sections' }],
    [
      'a stack below its foot',
      { method: 'sectional', ventTerminalFt: -3, highestFittingFt: -2 },
      { ventTerminalFt: 'ends-before-it-starts' },
    ],
    [
      'air without its numbers',
      { method: 'air', airPsi: null, airVolumeGal: null, pipeMaterial: null },
      { airPsi: 'required', airVolumeGal: 'required', pipeMaterial: 'required' },
    ],
    ['a site above the air', { elevationFt: 40_000 }, { elevationFt: 'out-of-range' }],
    ['201 plugs', { plugs: Array.from({ length: 201 }, () => plug) }, { plugs: 'too-many' }],
  ])('%s is refused', (_, changes, expected) => {
    expect(refusals({ ...dwvSample, ...changes })).toEqual(expected);
    for (const code of Object.values(expected)) expect(issueCodes).toContain(code);
  });

  it('leaves alone what the method does not use', () => {
    expect(
      refusals({
        ...dwvSample,
        method: 'stack-to-roof',
        atticCutFt: 90,
        standpipeFt: 90,
        maxSectionFt: 1,
        laundry: { floor: 'loft' },
      }),
    ).toEqual({});
  });

  it('reads null and absence alike', () => {
    const bare = {
      lowestFittingFt: -2,
      highestFittingFt: 13.5,
      ventTerminalFt: 26,
      method: 'stack-to-roof',
      rule: { headRule: { kind: 'fill-level' } },
    };
    const nulls = {
      ...bare,
      floors: null,
      riserIn: null,
      waterTempF: null,
      elevationFt: null,
      plugs: null,
      makersAllowAir: null,
      fillRateGpm: null,
    };
    const parsed = dwvPlanInput.parse(bare);
    expect(dwvPlanInput.parse(nulls)).toEqual(parsed);
    expect(parsed).toMatchObject({
      riserIn: 18,
      waterTempF: 60,
      elevationFt: 0,
      floors: [],
      makersAllowAir: false,
      cappedVents: 0,
    });
  });
});
