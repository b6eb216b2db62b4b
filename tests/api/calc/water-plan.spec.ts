import { describe, expect, it } from 'vitest';
import { waterInputs } from './inputs/water-inputs.js';
import { airEnergyFtLbf, atmospherePsi } from './second/physics.js';
import type { WaterRequest } from './second/water.input.js';
import { secondWaterPlan, waterCautions } from './second/water.js';
import { agree } from './support/agreement.js';
import { useCalcServer } from './support/calc-server.js';
import { codeDifferences, differences, ruleDifferences } from './support/differences.js';

describe('the water plan', () => {
  const server = useCalcServer();
  interface Place {
    name: string;
    pressurePsi: number;
  }
  const byName = (levels: Place[]) => [...levels].sort((a, b) => (a.name < b.name ? -1 : 1));

  it('computed twice is the same in every field', async () => {
    await agree(waterInputs, async (given) => {
      const plan = secondWaterPlan(given);
      const { reasons, takeDown, levels, ...expected } = plan;
      const body = await server.answer('water-plan', given);
      return [
        ...differences(expected, body),
        ...differences(byName(levels), byName(body.levels as Place[]), 'levels'),
        ...codeDifferences(reasons, body.reasons, 'reasons'),
        ...codeDifferences(takeDown, body.takeDown, 'takeDown'),
        ...ruleDifferences(waterCautions(given, plan), body.cautions, 'cautions'),
      ];
    });
  });

  const house: WaterRequest = {
    gaugeFt: 3.5,
    highestOutletFt: 17,
    lowestFittingFt: -1.5,
    medium: 'water',
    pipeMaterials: ['copper'],
    rule: { minimumPsi: 100, media: ['water', 'air'] },
    lowestRatedPsi: 400,
    gauge: { rangePsi: 400, incrementPsi: 1 },
  };
  const plan = async (changes: Partial<WaterRequest>) => server.answer('water-plan', { ...house, ...changes });

  it.each([
    // IRC P2503.9: to 10 psi 0.10 psi, to 100 psi 1 psi, above 2 % of the test pressure; the edges belong to the finer class
    [4.335, 0.1],
    [10, 0.1],
    [10.1, 1],
    [50, 1],
    [100, 1],
    [100.5, 2.01],
    [150, 3],
  ])('a test of %d psi needs a gauge of increments of %d psi', async (minimumPsi, increment) => {
    const { requiredIncrementPsi } = await plan({ rule: { ...house.rule, minimumPsi } });
    expect(requiredIncrementPsi).toBeCloseTo(increment, 9);
  });

  it('needs a foot of water for each foot the outlet stands over the gauge', async () => {
    // engineeringtoolbox head table: 0.432750 psi per foot at 20 °C
    const rule = { ...house.rule, measuredAt: 'highest-outlet' as const };
    const { floorPsi } = await plan({ rule, waterTempF: 68 });
    expect(Math.abs(Number(floorPsi) - (100 + 13.5 * 0.43275))).toBeLessThan(3e-5);
  });

  const energyOf = async (gaugePsi: number, airVolumeGal: number, elevationFt: number) => {
    const rule = { ...house.rule, minimumPsi: gaugePsi };
    return Number((await plan({ medium: 'air', rule, airVolumeGal, elevationFt })).storedEnergyFtLbf);
  };

  it('keeps the energy of 3 gal of air at 104 psig', async () => {
    // check-values.md 2, P_abs·V·ln(P_abs/P_atm): about 14,300 ft·lbf
    expect(Math.abs((await energyOf(104, 3, 0)) - 14_300)).toBeLessThan(50);
  });

  it.each([
    // U.S. Standard Atmosphere 1976, engineersedge table, psia, within 0.012
    [0, 14.696],
    [500, 14.43],
    [1000, 14.175],
    [2000, 13.664],
    [3000, 13.173],
    [5000, 12.23],
    [6000, 11.778],
    [7000, 11.341],
    [8000, 10.914],
    [9000, 10.506],
    [10_000, 10.108],
  ])('takes the air of %d ft to press %d psia', async (elevationFt, psia) => {
    // found back from the energy the server tells: the second computation's own atmosphere must agree with table and server alike
    expect(Math.abs(atmospherePsi(elevationFt) - psia)).toBeLessThanOrEqual(0.012);
    const told = await energyOf(100, 10, elevationFt);
    expect(told / airEnergyFtLbf(100, 10, elevationFt)).toBeCloseTo(1, 9);
    const absolute = 100 + psia;
    const fromTable = absolute * 144 * 10 * (231 / 1728) * Math.log(absolute / psia);
    expect(Math.abs(told / fromTable - 1)).toBeLessThan(0.001);
  });

  it.each([
    // a pipe maker's technical guide: never air, nor air over water, in these, whatever rule and makers say
    ['pvc', true, true, false],
    ['abs', true, true, false],
    ['cpvc', true, true, false],
    // 2018 IRC M2101.10, wording: compressed gas on PEX only where all makers authorise it and nothing else forbids it
    ['pex', true, true, true],
    ['pex', true, false, false],
    ['pex', false, true, false],
    ['copper', false, false, true],
  ] as const)('air in %s, rule %s, makers %s: usable %s', async (material, airOnPlastic, makersAllowAir, usable) => {
    const rule = { ...house.rule, airOnPlastic };
    const answer = await plan({ medium: 'air', pipeMaterials: [material], makersAllowAir, rule });
    expect(answer.usable).toBe(usable);
    expect((answer.reasons as { code: string }[]).map(({ code }) => code)).toEqual(usable ? [] : ['air-on-plastic']);
  });

  it('has more pressure the deeper the place', async () => {
    await agree(
      waterInputs.filter(({ medium }) => medium !== 'air'),
      async (given) => {
        const floors = given.floors ?? [];
        const heights = new Map(floors.map(({ name, elevationFt }) => [name, elevationFt]));
        const { levels } = (await server.answer('water-plan', given)) as unknown as { levels: Place[] };
        const known = levels.flatMap(({ name, pressurePsi }) => {
          const feet = heights.get(name);
          return feet === undefined ? [] : [{ feet, pressurePsi }];
        });
        known.sort((a, b) => b.feet - a.feet);
        if (known.length !== floors.length) return ['a floor is missing'];
        return known.flatMap(({ feet, pressurePsi }, index) => {
          const above = known[index - 1];
          return !above || pressurePsi > above.pressurePsi ? [] : [`less at ${feet} ft than at ${above.feet} ft`];
        });
      },
      60,
    );
  });
});
