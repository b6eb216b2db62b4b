import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dwvMethods } from '../holds/hold.states.js';
import { takeDownItems } from '../clearances/take-down.js';
import { dwvPlan, dwvPlanInput, type DwvPlanGiven } from './dwv-plan.contract.js';
import { planDwv } from './dwv-plan.js';
import { dwvSample } from './dwv-plan.sample.js';

const plan = (changes: Partial<DwvPlanGiven> = {}) => planDwv(dwvPlanInput.parse({ ...dwvSample, ...changes }));
const rule = (changes: Partial<DwvPlanGiven['rule']>): DwvPlanGiven['rule'] => ({
  acceptedMethods: [...dwvMethods],
  ...dwvSample.rule,
  ...changes,
});
const anyMethod = rule({ acceptedMethods: [...dwvMethods] });
const reasonCodesOf = (changes: Partial<DwvPlanGiven>) => plan(changes).reasons.map(({ code }) => code);
const cautionCodesOf = (changes: Partial<DwvPlanGiven>) => plan(changes).cautions.map(({ code }) => code);

describe('the worked example', () => {
  // The product's own worked numbers; head by Kell's density at 60 °F (999.016 kg/m³), printed to three places.
  const answer = plan();

  it('fills to the attic cut and is three feet short of ten above the highest fitting', () => {
    // IRC P2503.5.1 (2000–2009): 10 ft above the highest fitting connection
    expect(answer).toMatchObject({ fillLevelFt: 20.5, requiredLevelFt: 23.5, shortByFt: 3, usable: false });
    expect(answer.reasons).toEqual([{ code: 'level-short', params: { shortByFt: 3 } }]);
    expect(answer.notUnderTest).toEqual([{ fromFt: 20.5, toFt: 26 }]);
  });

  it('says what stands on every floor, fitting and plug, top down', () => {
    expect(answer.levels.map(({ name, headFt }) => [name, headFt])).toEqual([
      ['second', 10.5],
      ['first', 20.5],
      ['highest fitting', 7],
      ['lowest fitting', 22.5],
      ['building drain', 22.5],
    ]);
    expect(answer.levels[0]?.pressurePsi).toBeCloseTo(4.5476, 3);
    expect(answer.plugs[0]?.pressurePsi).toBeCloseTo(9.7448, 3);
    expect(answer.plugs[0]?.loadFraction).toBeCloseTo(9.7448 / 17, 4);
  });

  it('weighs the plug’s thrust, the water and the time', () => {
    expect(answer.plugs[0]?.forceLbf).toBeCloseTo(9.7448 * (Math.PI / 4) * 4.026 ** 2, 1); // bore of ASTM D2665
    expect(answer.volumeGal).toBeCloseTo(22.5 * 0.38403, 3); // ASTM D2665: 0.38403 gal/ft for 3 in
    expect(answer.weightLb).toBeCloseTo(22.5 * 0.38403 * 3.785412 * 0.999016 * 2.204623, 2); // NIST SP 811, Kell
    expect(answer.fillMinutes).toBeCloseTo((22.5 * 0.38403) / 6, 3);
  });

  it('says what is to be put back and what to beware of', () => {
    expect(answer.takeDown).toEqual([
      'rejoin-vent-cut',
      'uncap-vents',
      'remove-test-plugs',
      'remove-caps',
      'clear-traps',
    ]);
    expect(answer.cautions.map(({ code }) => code)).toEqual([
      'plug-stand-aside',
      'discharge',
      'backflow',
      'attic',
      'local-code',
    ]);
    expect(answer).toMatchObject({ lifts: null, air: null });
  });

  it('fits its own contract', () => {
    for (const method of dwvMethods) expect(dwvPlan.parse(plan({ method }))).toEqual(plan({ method }));
  });
});

describe('required level', () => {
  it.each([
    [5, 18.5], // IRC 2018 P2503.5.1 (secondary source): 5 ft
    [10, 23.5], // IRC P2503.5.1 (2000–2009): 10 ft, or to the highest point of the system
    [20, 26], // the same: never above the highest point
    [6, 19.5], // a municipal code: 6 ft above all parts
    [3.5, 17], // a municipal code: 42 in, taken above the highest fitting
  ])('%d ft above the highest fitting is %d', (feet, level) => {
    expect(plan({ rule: rule({ headRule: { kind: 'above-highest-fitting', feet } }) }).requiredLevelFt).toBe(level);
  });

  it('ten feet of head are 4.3 psi at the highest fitting', () => {
    const full = plan({ method: 'stack-to-roof', ventTerminalFt: 23.5, atticCutFt: null });
    const fitting = full.levels.find(({ name }) => name === 'highest fitting');
    expect(fitting?.headFt).toBe(10);
    // NIST SP 811, conventional water: 4.33528 psi; water at 60 °F is lighter by one part in a thousand.
    expect((fitting?.pressurePsi ?? 0) / 4.33528).toBeCloseTo(1, 2);
  });

  it('is the method’s own where the rule says fill level', () => {
    const answer = plan({ rule: rule({ headRule: { kind: 'fill-level' } }) });
    expect(answer).toMatchObject({ requiredLevelFt: 20.5, shortByFt: 0, usable: true, reasons: [] });
  });
});

describe('methods', () => {
  it.each<[DwvPlanGiven['method'], Partial<DwvPlanGiven>, number]>([
    ['stack-to-roof', {}, 26],
    ['attic-cut', {}, 20.5], // common practice, no published source
    ['laundry-box', {}, 13.5], // common practice, no published source
    ['laundry-riser', { laundry: { floor: 'first', branchFt: 1.2 } }, 2.7], // 18 in riser: common practice, no published source
    ['standpipe', {}, 10],
  ])('%s fills to its own level', (method, changes, level) => {
    const answer = plan({ method, ...changes, rule: { ...anyMethod, headRule: { kind: 'fill-level' } } });
    expect(answer.fillLevelFt).toBeCloseTo(level, 9);
    expect(answer).toMatchObject({ usable: true });
  });

  it('wants a box for a laundry upstairs and a riser for one on the lowest floor', () => {
    const own = { ...anyMethod, headRule: { kind: 'fill-level' as const } };
    expect(reasonCodesOf({ method: 'laundry-box', laundry: { floor: 'first', boxOutletFt: 3.5 }, rule: own })).toEqual([
      'laundry-on-lowest-floor',
    ]);
    expect(reasonCodesOf({ method: 'laundry-riser', rule: own })).toEqual(['laundry-not-on-lowest-floor']);
    const basement = [...(dwvSample.floors ?? []), { name: 'basement', elevationFt: -9 }];
    expect(
      reasonCodesOf({ method: 'laundry-riser', laundry: { floor: 'first', branchFt: 1 }, floors: basement, rule: own }),
    ).toEqual(['laundry-not-on-lowest-floor']);
  });

  it('takes only what the rule card accepts', () => {
    expect(plan({ method: 'standpipe' }).reasons[0]).toEqual({
      code: 'method-not-accepted',
      params: { method: 'standpipe' },
    });
    expect(reasonCodesOf({ rule: { headRule: { kind: 'fill-level' } } })).toEqual(['method-not-accepted']);
  });

  it.each<[DwvPlanGiven['method'], string[]]>([
    ['attic-cut', ['rejoin-vent-cut']],
    ['laundry-riser', ['remove-laundry-riser', 'close-branch']],
    ['laundry-box', ['close-box-knockout']],
    ['standpipe', ['cut-standpipe-and-cap']],
    ['sectional', ['cap-test-tees']],
    ['air', ['release-air']],
    ['stack-to-roof', []],
  ])('%s leaves %j to be put back, beside caps and traps', (method, own) => {
    const bare = plan({ method, cappedVents: 0, plugs: [], rule: anyMethod });
    expect(bare.takeDown).toEqual([...own, 'remove-caps', 'clear-traps']);
    for (const item of bare.takeDown) expect(takeDownItems).toHaveProperty(item);
  });
});

describe('plugs', () => {
  it('overload once each, by name, only beyond their rating', () => {
    const plugs = [
      { name: 'drain', elevationFt: -2, ratedPsi: 9 },
      { name: 'branch', elevationFt: 12, ratedPsi: 9 },
      { name: 'tee', elevationFt: -2, ratedPsi: 9.7 },
    ];
    const answer = plan({ method: 'attic-cut', plugs, rule: rule({ headRule: { kind: 'fill-level' } }) });
    expect(answer.reasons.map(({ code, params }) => [code, params.name])).toEqual([
      ['plug-overloaded', 'drain'],
      ['plug-overloaded', 'tee'],
    ]);
    expect(answer.plugs.map(({ forceLbf }) => forceLbf)).toEqual([null, null, null]);
    expect(answer.usable).toBe(false);
  });

  it('are spoken of by name above four fifths of their rating', () => {
    const loaded = (ratedPsi: number) =>
      plan({ plugs: [{ name: 'drain', elevationFt: -2, ratedPsi, nominalIn: 4 }] }).cautions;
    expect(loaded(12).find(({ code }) => code === 'plug-load')?.params).toMatchObject({ name: 'drain' });
    expect(loaded(12.3).some(({ code }) => code === 'plug-load')).toBe(false);
  });

  it('above the water bear nothing', () => {
    const [load] = plan({ plugs: [{ name: 'roof', elevationFt: 25, ratedPsi: 17, nominalIn: 3 }] }).plugs;
    expect(load).toMatchObject({ headFt: 0, pressurePsi: 0, loadFraction: 0, forceLbf: 0 });
  });
});

describe('air', () => {
  const air = (changes: Partial<DwvPlanGiven> = {}) => plan({ method: 'air', rule: anyMethod, ...changes });

  it('stands the same everywhere and has no level, water or time', () => {
    const answer = air({ pipeMaterial: 'cast-iron' });
    expect(answer).toMatchObject({
      fillLevelFt: null,
      requiredLevelFt: null,
      shortByFt: null,
      volumeGal: null,
      weightLb: null,
      fillMinutes: null,
    });
    expect(answer.levels.every(({ headFt, pressurePsi }) => headFt === null && pressurePsi === 5)).toBe(true); // IRC/IPC: 5 psi
    expect(answer.plugs[0]).toMatchObject({ headFt: null, pressurePsi: 5, loadFraction: 5 / 17 });
    expect(answer).toMatchObject({ usable: true, notUnderTest: [], lifts: null });
    expect(answer.cautions.map(({ code }) => code)).toEqual([
      'compressed-air',
      'under-pressure',
      'plug-stand-aside',
      'local-code',
    ]);
  });

  it('keeps the energy that P·V·ln says', () => {
    // Sea level 14.6959 psia (U.S. Standard Atmosphere 1976), 30 gal = 4.0104 ft³ (231 in³ each)
    const absPsi = 5 + 14.6959;
    const expected = absPsi * 144 * ((30 * 231) / 1728) * Math.log(absPsi / 14.6959);
    expect(air({ elevationFt: 0 }).air).toMatchObject({ pressurePsi: 5 });
    expect(air({ elevationFt: 0 }).air?.energyFtLbf).toBeCloseTo(expected, 6);
  });

  it('is not for plastic unless the department and the makers allow it', () => {
    // IPC 312.3; CPC 712.1
    expect(air().reasons.map(({ code }) => code)).toEqual(['air-on-plastic']);
    expect(air({ rule: { ...anyMethod, airOnPlastic: true } }).usable).toBe(false);
    expect(air({ rule: { ...anyMethod, airOnPlastic: true }, makersAllowAir: true }).usable).toBe(true);
  });

  it('needs neither level nor water fields', () => {
    const given = {
      ...dwvSample,
      method: 'air',
      ventTerminalFt: null,
      atticCutFt: null,
      standpipeFt: null,
      laundry: null,
      rule: { acceptedMethods: ['air'] },
    };
    expect(dwvPlanInput.safeParse(given).success).toBe(true);
  });
});

describe('cautions', () => {
  it('name the floors the test proves nothing on', () => {
    const [caution] = plan({ method: 'standpipe', standpipeFt: 9 }).cautions.filter(
      ({ code }) => code === 'floors-not-under-test',
    );
    expect(caution?.params).toEqual({ floors: ['second'] });
    expect(cautionCodesOf({ method: 'standpipe', standpipeFt: 10 })).not.toContain('floors-not-under-test');
  });

  it('go with the place where the water is put in', () => {
    expect(cautionCodesOf({ method: 'stack-to-roof' })).toEqual(expect.arrayContaining(['roof', 'ladder']));
    expect(cautionCodesOf({ method: 'standpipe' })).toContain('trench');
    expect(cautionCodesOf({ method: 'attic-cut' })).toContain('attic');
    for (const method of dwvMethods) expect(cautionCodesOf({ method }).at(-1)).toBe('local-code');
  });
});

describe('properties', () => {
  const level = fc.double({ min: -2, max: 26, noNaN: true });

  it('a higher fill level never lowers a pressure, a volume or a plug’s load', () => {
    fc.assert(
      fc.property(level, level, (a, b) => {
        const low = plan({ atticCutFt: Math.min(a, b) });
        const high = plan({ atticCutFt: Math.max(a, b) });
        low.levels.forEach(({ pressurePsi }, index) =>
          expect(high.levels[index]?.pressurePsi).toBeGreaterThanOrEqual(pressurePsi),
        );
        expect(high.volumeGal).toBeGreaterThanOrEqual(low.volumeGal ?? Infinity);
        expect(high.plugs[0]?.loadFraction).toBeGreaterThanOrEqual(low.plugs[0]?.loadFraction ?? Infinity);
      }),
    );
  });
});
