import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { testRule, type TestRule } from '../departments/rule-card.content.js';
import { dwvMethods, media } from '../holds/hold.states.js';
import { houseGeometry, type HouseGeometryGiven } from '../hydraulics/house-geometry.js';
import { groundworkHouse, standpipeEndFt } from './groundwork-house.js';
import { planTools, usualTools, type PlanToolsGiven } from './plan-tools.js';
import { planWays } from './plan-ways.js';
import { planWay, type PlanWay } from './plan.contract.js';

const house = (overrides: HouseGeometryGiven = {}) =>
  houseGeometry.parse({
    floors: [
      { name: 'first', elevationFt: 0 },
      { name: 'second', elevationFt: 10 },
    ],
    ...{ lowestFittingFt: -2, highestFittingFt: 13.5, ventTerminalFt: 26, cappedVents: 1, atticCutFt: 20.5 },
    ...{ standpipeFt: 10, laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 }, pipeMaterial: 'pvc' },
    plugs: [{ name: 'building drain', elevationFt: -2, ratedPsi: 17, nominalIn: 4 }],
    pipes: [{ nominalIn: 3, material: 'pvc-sch40', bottomFt: -2, topFt: 26, lengthFt: 28 }],
    ...{ gaugeFt: 3.5, highestOutletFt: 17, waterLowestFittingFt: -1.5, waterPipeMaterials: ['copper'] },
    ...{ lowestRatedPsi: 150, lowestRatedAirPsi: 125, supplyPsi: 62 },
    ...overrides,
  });

const rule = (overrides: Partial<TestRule> = {}): TestRule =>
  testRule.parse({
    ...{ stageCode: 'rough-in', system: 'dwv', acceptedMethods: ['stack-to-roof', 'attic-cut'] },
    ...{ headRule: { kind: 'above-highest-fitting', feet: 10 }, pressures: [], measuredAt: 'gauge', standMinutes: 15 },
    ...{ airOnPlastic: false, settleMinutes: 0, gaugeIncrements: [], mayStayIsolated: [], levelSeenFrom: [] },
    photoWanted: { reading: false, fix: false, takeDown: false },
    ...overrides,
  });
const waterRule = (overrides: Partial<TestRule> = {}): TestRule =>
  rule({
    ...{ system: 'water', acceptedMethods: ['gauge'], headRule: null },
    pressures: [
      { medium: 'water', minimumPsi: 100, preferredPsi: 120 },
      { medium: 'water-topped-with-air', minimumPsi: 100, preferredPsi: 120 },
    ],
    ...overrides,
  });

interface Given {
  house?: ReturnType<typeof house>;
  rule?: TestRule;
  isGroundwork?: boolean;
  tools?: PlanToolsGiven;
}
const waysOf = ({ tools, isGroundwork = false, ...given }: Given = {}): PlanWay[] =>
  planWays({
    house: house(),
    rule: rule(),
    isGroundwork,
    tools: planTools.parse(tools ?? {}),
    elevationFt: 850,
    ...given,
  });
const wayOf = (ways: PlanWay[], method: string): PlanWay | undefined => ways.find((way) => way.method === method);
const codes = (way: PlanWay | undefined): string[] => (way?.reasons ?? []).map(({ code }) => code);

describe('ways to test drains', () => {
  it('tells all seven, offers what serves and says why the others do not', () => {
    const ways = waysOf();
    expect(ways.map(({ method }) => method)).toEqual([...dwvMethods]);
    // calculations.md, section 2, worked example: 20.5 ft is 3 ft short of 13.5 + 10
    expect(wayOf(ways, 'attic-cut')).toMatchObject({
      isOffered: false,
      reasons: [{ code: 'level-short', params: { shortByFt: 3 } }],
      dwv: { fillLevelFt: 20.5, requiredLevelFt: 23.5, takeDown: expect.arrayContaining(['rejoin-vent-cut']) },
    });
    expect(wayOf(ways, 'stack-to-roof')?.isOffered).toBe(true);
    expect(codes(wayOf(ways, 'air'))).toEqual(['method-not-accepted', 'air-on-plastic']);
    expect(ways.filter(({ isOffered }) => !isOffered).every((way) => way.reasons.length > 0)).toBe(true);
  });

  it('names the measures that a way accepted by the card is missing', () => {
    const bare = house({ atticCutFt: null, highestFittingFt: null });
    expect(wayOf(waysOf({ house: bare }), 'attic-cut')).toMatchObject({
      ...{ isOffered: false, dwv: null, reasons: [] },
      missing: [
        { field: 'highestFittingFt', code: 'required' },
        { field: 'atticCutFt', code: 'required' },
      ],
    });
  });

  it('takes air’s pressure from the card, its volume from the pipes, and refuses air the card gives no pressure for', () => {
    const castIron = house({ pipeMaterial: 'cast-iron' });
    const asked = rule({
      acceptedMethods: ['air'],
      headRule: null,
      pressures: [{ medium: 'air', minimumPsi: 5, preferredPsi: null }],
    });
    const air = wayOf(waysOf({ house: castIron, rule: asked }), 'air');
    // ASTM D2665 dimensions: 3 in schedule 40 holds 0.38403 gal/ft; the pipe is 28 ft long
    expect(air).toMatchObject({ medium: 'air', isOffered: true, dwv: { air: { pressurePsi: 5 }, volumeGal: null } });
    const withVolume = wayOf(waysOf({ house: castIron, rule: asked, tools: { airVolumeGal: 28 * 0.38403 } }), 'air');
    const energies = [air, withVolume].map((way) => way?.dwv?.air?.energyFtLbf ?? 0);
    expect(energies[0]).toBeCloseTo(energies[1] ?? 0, 1);
    const without = rule({ acceptedMethods: ['air'], headRule: null });
    expect(codes(wayOf(waysOf({ house: castIron, rule: without, tools: { airPsi: 5 } }), 'air'))).toEqual([
      'medium-not-accepted',
    ]);
  });

  it('uses the plumber’s plugs, riser, section and fill rate instead of the usual', () => {
    const laundryDown = house({ laundry: { floor: 'first', boxOutletFt: 3.5, branchFt: 0.9 } });
    const open = rule({ acceptedMethods: ['laundry-riser', 'sectional'], headRule: { kind: 'fill-level', feet: 10 } });
    const usual = waysOf({ house: laundryDown, rule: open });
    expect(wayOf(usual, 'laundry-riser')?.dwv?.fillLevelFt).toBeCloseTo(0.9 + 1.5, 9);
    expect(wayOf(usual, 'sectional')?.dwv?.lifts).toHaveLength(1);
    const tools = {
      riserIn: 24,
      maxSectionFt: 14,
      fillRateGpm: 5,
      plugs: [{ name: 'tee', elevationFt: 4, ratedPsi: 3 }],
    };
    const own = waysOf({ house: laundryDown, rule: open, tools });
    expect(wayOf(own, 'laundry-riser')?.dwv?.fillLevelFt).toBeCloseTo(0.9 + 2, 9);
    // 28 ft in sections of 14 ft that overlap by 10 ft: 1 + ceil(14 / 4)
    expect(wayOf(own, 'sectional')?.dwv?.lifts).toHaveLength(5);
    expect(wayOf(own, 'sectional')?.dwv?.plugs.map(({ name }) => name)).toEqual(['tee']);
    expect(wayOf(own, 'laundry-riser')?.dwv?.fillMinutes).toBeCloseTo(((2.9 + 2) * 0.38403) / 5, 2);
  });
});

describe('ways to test drains under a slab', () => {
  const groundwork = rule({ stageCode: 'groundwork', acceptedMethods: ['standpipe', 'sectional'] });

  it('counts what is there before the slab: stubs, the pipes under it, no floors above', () => {
    const there = groundworkHouse(house());
    expect(there).toMatchObject({ highestFittingFt: 0, cappedVents: 0, laundry: null, atticCutFt: null });
    expect(there.floors.map(({ name }) => name)).toEqual(['first']);
    expect(there.pipes).toEqual([expect.objectContaining({ bottomFt: -2, topFt: 0, lengthFt: 2 })]);
  });

  it('holds a standpipe against the rule, though no vent terminal stands yet', () => {
    const [short, enough] = [6, 10].map((standpipeFt) =>
      wayOf(
        waysOf({ house: house({ standpipeFt, ventTerminalFt: null }), rule: groundwork, isGroundwork: true }),
        'standpipe',
      ),
    );
    expect(short).toMatchObject({ isOffered: false, reasons: [{ code: 'level-short', params: { shortByFt: 4 } }] });
    expect(enough).toMatchObject({ isOffered: true, dwv: { fillLevelFt: 10, requiredLevelFt: 10, notUnderTest: [] } });
    expect(standpipeEndFt(groundworkHouse(house({ standpipeFt: 12 })), 10)).toBe(12);
  });

  it('never has more water under the slab than in the whole house', () => {
    const span = fc.record({ bottomFt: fc.integer({ min: -6, max: 6 }), riseFt: fc.integer({ min: 0, max: 20 }) });
    fc.assert(
      fc.property(fc.array(span, { maxLength: 6 }), (spans) => {
        const pipes = spans.map(({ bottomFt, riseFt }) => ({
          ...{ nominalIn: 3 as const, material: 'pvc-sch40' as const, bottomFt, topFt: bottomFt + riseFt },
          lengthFt: riseFt + 1,
        }));
        const lengthOf = (all: readonly { lengthFt: number }[]): number =>
          all.reduce((sum, { lengthFt }) => sum + lengthFt, 0);
        expect(lengthOf(groundworkHouse(house({ pipes })).pipes)).toBeLessThanOrEqual(lengthOf(pipes) + 1e-9);
      }),
    );
  });
});

describe('ways to test water lines', () => {
  it('is one for each medium, with target and ceiling, and why a medium does not serve', () => {
    const ways = waysOf({ rule: waterRule() });
    expect(ways.map(({ medium }) => medium)).toEqual([...media]);
    // calculations.md, section 3: rated 150 less the head of 5 ft (NIST SP 811: 0.4335 psi a foot), down to a whole psi
    expect(ways[0]).toMatchObject({ isOffered: true, water: { floorPsi: 100, targetPsi: 120, ceilingPsi: 147 } });
    expect(ways[1]).toMatchObject({ isOffered: true, water: { ceilingPsi: 122 } });
    expect(ways[2]).toMatchObject({ isOffered: false, isAccepted: false, reasons: [{ code: 'medium-not-accepted' }] });
  });

  it('holds the gauge in hand against the card', () => {
    const gauge = { rangePsi: 100, incrementPsi: 2 };
    expect(codes(waysOf({ rule: waterRule(), tools: { gauge } })[0])).toEqual(['gauge-too-coarse', 'gauge-range']);
  });

  it('refuses air over plastic, and a minimum above the lowest-rated part', () => {
    const plastic = house({ waterPipeMaterials: ['pex'], lowestRatedPsi: 80 });
    const [water, topped] = waysOf({ house: plastic, rule: waterRule() });
    expect(codes(water)).toEqual(['above-rated-part']);
    expect(codes(topped)).toEqual(['air-on-plastic', 'above-rated-part']);
  });

  it('names what nobody measured', () => {
    const [water] = waysOf({
      house: house({ gaugeFt: null, waterLowestFittingFt: null, lowestRatedPsi: null }),
      rule: waterRule(),
    });
    expect(water?.missing.map(({ field, code }) => [field, code])).toEqual([
      ['gaugeFt', 'required'],
      ['waterLowestFittingFt', 'required'],
      ['lowestRatedPsi', 'required'],
    ]);
  });
});

describe('every way', () => {
  it('is what the contract says, whatever the rule accepts', () => {
    fc.assert(
      fc.property(fc.subarray([...dwvMethods], { minLength: 1 }), fc.boolean(), (acceptedMethods, isGroundwork) => {
        const ways = waysOf({ rule: rule({ acceptedMethods }), isGroundwork });
        for (const way of ways) {
          expect(planWay.parse(way)).toEqual(way);
          expect(way.isOffered).toBe(way.reasons.length === 0 && way.missing.length === 0 && way.isAccepted);
          if (!way.isOffered) expect(way.reasons.length + way.missing.length).toBeGreaterThan(0);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('leaves the tools as the usual ones where none are told', () => {
    expect(usualTools()).toMatchObject({ gauge: { rangePsi: 200, incrementPsi: 1 }, riserIn: 18, plugs: null });
  });
});
