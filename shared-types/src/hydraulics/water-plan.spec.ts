import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { media } from '../holds/hold.states.js';
import { issueCodes } from './issue-codes.js';
import { waterPlan, waterPlanInput, type WaterPlanGiven } from './water-plan.contract.js';
import { planWater } from './water-plan.js';

const sample: WaterPlanGiven = {
  gaugeFt: 3.5,
  highestOutletFt: 17,
  lowestFittingFt: -1.5,
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
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
  },
  lowestRatedPsi: 150,
  lowestRatedAirPsi: 125,
  supplyPsi: 62,
  gauge: { rangePsi: 200, incrementPsi: 1 },
  waterTempF: 60,
};
const rule = (changes: Partial<WaterPlanGiven['rule']>) => ({ ...sample.rule, ...changes });
const plan = (changes: Partial<WaterPlanGiven> = {}) => planWater(waterPlanInput.parse({ ...sample, ...changes }));
const reasonCodesOf = (changes: Partial<WaterPlanGiven>) => plan(changes).reasons.map(({ code }) => code);
const cautionCodesOf = (changes: Partial<WaterPlanGiven>) => plan(changes).cautions.map(({ code }) => code);

/** psi per foot at 60 °F: 999.016 kg/m³ (Kell 1975) × 9.80665 m/s² × 0.3048 m ÷ 6894.757 Pa (NIST SP 811). */
const psiPerFoot = (999.016 * 9.80665 * 0.3048) / 6894.757;

describe('the worked example', () => {
  it('pumps to the preferred 120 between the minimum and the weakest part', () => {
    // 100 psi asked for, 120 pumped for margin: common practice, no published source
    const answer = plan();
    // The part rated 125 for air stands 5 ft under the gauge: 125 − 2.16 rounded down to the gauge's increment.
    expect(answer).toMatchObject({
      floorPsi: 100,
      targetPsi: 120,
      ceilingPsi: 122,
      usable: true,
      reasons: [],
      needsTopUp: true,
    });
    expect(answer.takeDown).toEqual(['remove-gauge-and-hose', 'open-isolated', 'flush', 'release-air']);
  });

  it('says what every floor stands under', () => {
    const { levels } = plan();
    expect(levels.map(({ name }) => name)).toEqual(['second', 'first', 'highest outlet', 'lowest fitting']);
    // Four places: the constants above are rounded
    [-6.5, 3.5, -13.5, 5].forEach((feet, index) =>
      expect(levels[index]?.pressurePsi).toBeCloseTo(120 + feet * psiPerFoot, 4),
    );
  });

  it('keeps the energy that P·V·ln says', () => {
    const absPsi = 120 + 14.6959; // sea level, U.S. Standard Atmosphere 1976
    const expected = absPsi * 144 * ((1.5 * 231) / 1728) * Math.log(absPsi / 14.6959);
    expect(plan().storedEnergyFtLbf).toBeCloseTo(expected, 6);
    expect(plan({ airVolumeGal: null }).storedEnergyFtLbf).toBeNull();
    expect(plan({ medium: 'water' }).storedEnergyFtLbf).toBeNull();
  });

  it('fits its own contract', () => {
    for (const medium of media) expect(waterPlan.parse(plan({ medium }))).toEqual(plan({ medium }));
  });
});

describe('floor, ceiling and target', () => {
  it('measured at the highest outlet the column comes on top', () => {
    const atTop = rule({ measuredAt: 'highest-outlet', preferredPsi: null });
    expect(plan({ rule: atTop }).floorPsi).toBeCloseTo(100 + 13.5 * psiPerFoot, 4);
    expect(plan({ rule: atTop }).targetPsi).toBe(106);
    expect(plan({ rule: atTop, highestOutletFt: 2 }).floorPsi).toBe(100);
  });

  it('air weighs nothing', () => {
    const air = { medium: 'air' as const, rule: rule({ measuredAt: 'highest-outlet', media: ['air'] }) };
    expect(plan(air)).toMatchObject({ floorPsi: 100, ceilingPsi: 125, targetPsi: 120 });
    expect(plan(air).levels.every(({ pressurePsi }) => pressurePsi === 120)).toBe(true);
  });

  it('a rating for air counts only with air', () => {
    expect(plan({ medium: 'water' }).ceilingPsi).toBe(147);
    expect(plan({ lowestRatedAirPsi: null }).ceilingPsi).toBe(147);
    expect(plan({ lowestRatedAirPsi: 400 }).ceilingPsi).toBe(147);
  });

  it('gives way to the ceiling as long as the rule is still satisfied', () => {
    expect(plan({ lowestRatedAirPsi: 112 })).toMatchObject({ ceilingPsi: 109, targetPsi: 109, usable: true });
    const both = plan({ lowestRatedAirPsi: 100 });
    expect(both).toMatchObject({ ceilingPsi: 97, targetPsi: 120, usable: false });
    expect(both.reasons.map(({ code }) => code)).toEqual(['above-rated-part']);
  });

  it('a strict local supply test: working and 50, at least 150', () => {
    // New York City 312.5: at least 150 psi; 150 psi wants a gauge of 3 psi or finer (IRC P2503.9)
    const strict = plan({
      medium: 'water',
      rule: rule({ minimumPsi: 150, preferredPsi: null }),
      lowestRatedPsi: 200,
      gauge: { rangePsi: 300, incrementPsi: 2 },
    });
    expect(strict).toMatchObject({ floorPsi: 150, targetPsi: 150, requiredIncrementPsi: 3, usable: true });
  });

  it('rounds up to the gauge’s increment and down under the ceiling', () => {
    const coarse = plan({
      gauge: { rangePsi: 200, incrementPsi: 5 },
      rule: rule({ minimumPsi: 101, preferredPsi: 111 }),
    });
    expect(coarse).toMatchObject({ targetPsi: 115, ceilingPsi: 120 });
  });
});

describe('reasons', () => {
  it.each<[string, Partial<WaterPlanGiven>, string[]]>([
    ['a medium the rule card does not take', { medium: 'air' }, ['medium-not-accepted']],
    [
      'air in CPVC whoever allows it',
      { pipeMaterials: ['copper', 'cpvc'], makersAllowAir: true, rule: rule({ airOnPlastic: true }) },
      ['air-on-plastic'],
    ],
    [
      'air in PEX that the makers forbid',
      { pipeMaterials: ['pex'], rule: rule({ airOnPlastic: true }) },
      ['air-on-plastic'],
    ],
    ['air in PEX that the rule forbids', { pipeMaterials: ['pex'], makersAllowAir: true }, ['air-on-plastic']],
    [
      'air in PEX that all allow',
      { pipeMaterials: ['pex'], makersAllowAir: true, rule: rule({ airOnPlastic: true }) },
      [],
    ],
    ['water in any plastic', { medium: 'water', pipeMaterials: ['pvc', 'pex', 'abs', 'cpvc'] }, []],
    ['a coarse gauge', { gauge: { rangePsi: 200, incrementPsi: 2 } }, ['gauge-too-coarse']],
    ['a gauge that ends too early', { gauge: { rangePsi: 100, incrementPsi: 1 } }, ['gauge-range']],
    ['a gauge that just reaches', { gauge: { rangePsi: 120, incrementPsi: 1 } }, []],
  ])('%s', (_, changes, codes) => {
    expect(reasonCodesOf(changes)).toEqual(codes);
    expect(plan(changes).usable).toBe(codes.length === 0);
  });
});

describe('topping up and cautions', () => {
  it('needs no pump where the street gives enough, and cannot say without its pressure', () => {
    expect(plan({ supplyPsi: 120 }).needsTopUp).toBe(false);
    expect(plan({ supplyPsi: null }).needsTopUp).toBeNull();
    expect(cautionCodesOf({ supplyPsi: 120 })).not.toContain('close-the-main');
    expect(cautionCodesOf({})).toContain('close-the-main');
  });

  it('speaks of the air, the water and the relief valve', () => {
    expect(plan().cautions[0]).toEqual({
      code: 'compressed-air',
      params: { pressurePsi: 120, energyFtLbf: plan().storedEnergyFtLbf },
    });
    expect(cautionCodesOf({ medium: 'water' })).toEqual([
      'under-pressure',
      'backflow',
      'potable-only',
      'close-the-main',
      'relief-valve',
      'local-code',
    ]);
    expect(cautionCodesOf({ medium: 'air' })).not.toContain('backflow');
  });
});

describe('bad input', () => {
  it.each<[string, Record<string, unknown>, Record<string, string>]>([
    ['an unknown key', { pump: 1 }, { '': 'unknown' }],
    ['a rating of zero', { lowestRatedPsi: 0 }, { lowestRatedPsi: 'must-be-positive' }],
    [
      'an increment of zero',
      { gauge: { rangePsi: 200, incrementPsi: 0 } },
      { 'gauge.incrementPsi': 'must-be-positive' },
    ],
    ['no gauge', { gauge: undefined }, { gauge: 'required' }],
    ['no minimum', { rule: { media: ['water'] } }, { 'rule.minimumPsi': 'required' }],
    ['an infinite range', { gauge: { rangePsi: Infinity, incrementPsi: 1 } }, { 'gauge.rangePsi': 'must-be-a-number' }],
    ['no such medium', { medium: 'steam' }, { medium: 'not-one-of-the-choices' }],
    ['no such material', { pipeMaterials: ['copper', 'lead'] }, { 'pipeMaterials.1': 'not-one-of-the-choices' }],
    ['lowest above highest', { lowestFittingFt: 18 }, { lowestFittingFt: 'lowest-above-highest' }],
    [
      'a floor named twice',
      {
        floors: [
          { name: 'a', elevationFt: 0 },
          { name: 'a', elevationFt: 1 },
        ],
      },
      { 'floors.1.name': 'floor-named-twice' },
    ],
    [
      'a table row of two kinds',
      { rule: rule({ gaugeIncrements: [{ incrementPsi: 1, percent: 2 }] }) },
      { 'rule.gaugeIncrements.0': 'increment-or-percent' },
    ],
  ])('%s is refused', (_, changes, expected) => {
    const issues = waterPlanInput.safeParse({ ...sample, ...changes }).error?.issues ?? [];
    expect(Object.fromEntries(issues.map(({ path, message }) => [path.join('.'), message]))).toEqual(expected);
    for (const code of Object.values(expected)) expect(issueCodes).toContain(code);
  });
});

describe('properties', () => {
  it('a usable plan satisfies the rule, spares the weakest part and can be read off the gauge', () => {
    const given = fc.record({
      gaugeFt: fc.double({ min: -8, max: 20, noNaN: true }),
      minimumPsi: fc.double({ min: 1, max: 160, noNaN: true }),
      preferredPsi: fc.option(fc.double({ min: 1, max: 200, noNaN: true })),
      lowestRatedPsi: fc.double({ min: 50, max: 250, noNaN: true }),
      incrementPsi: fc.constantFrom(0.1, 0.5, 1, 2),
    });
    let usable = 0;
    fc.assert(
      fc.property(given, ({ gaugeFt, minimumPsi, preferredPsi, lowestRatedPsi, incrementPsi }) => {
        const measured = rule({ minimumPsi, preferredPsi, measuredAt: 'highest-outlet' });
        const answer = plan({
          gaugeFt,
          rule: measured,
          lowestRatedPsi,
          lowestRatedAirPsi: null,
          gauge: { rangePsi: 300, incrementPsi },
        });
        if (!answer.usable) return;
        usable += 1;
        const at = (name: string) => answer.levels.find((level) => level.name === name)?.pressurePsi ?? Number.NaN;
        expect(answer.targetPsi).toBeGreaterThanOrEqual(minimumPsi - 1e-6);
        // A gauge below the outlet carries the column; one above it is not credited with it.
        if (gaugeFt <= 17) expect(at('highest outlet')).toBeGreaterThanOrEqual(minimumPsi - 1e-6);
        if (gaugeFt >= -1.5) expect(at('lowest fitting')).toBeLessThanOrEqual(lowestRatedPsi + 1e-6);
        const steps = answer.targetPsi / incrementPsi;
        expect(Math.abs(steps - Math.round(steps))).toBeLessThan(1e-6);
      }),
    );
    expect(usable).toBeGreaterThan(0);
  });
});
