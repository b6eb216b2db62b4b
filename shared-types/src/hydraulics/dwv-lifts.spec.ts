import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { headInLiftsFt, liftsOf } from './dwv-lifts.js';
import { dwvPlanInput } from './dwv-plan.contract.js';
import { planDwv } from './dwv-plan.js';
import { dwvSample } from './dwv-plan.sample.js';

describe('a stack tested by sections', () => {
  it('re-tests the upper 10 ft of the section before', () => {
    // IPC 312.2: sections with the upper 10 ft of the preceding one tested again; at most 30 ft each in one city
    expect(liftsOf(-2, 60, 30, 10)).toEqual([
      { fromFt: -2, toFt: 28, headFt: 30 },
      { fromFt: 18, toFt: 48, headFt: 30 },
      { fromFt: 38, toFt: 60, headFt: 22 },
    ]);
  });

  it('is one lift where the stack is no higher than a section', () => {
    expect(liftsOf(-2, 26, 30, 10)).toEqual([{ fromFt: -2, toFt: 26, headFt: 28 }]);
    expect(liftsOf(-2, 28, 30, 10)).toEqual([{ fromFt: -2, toFt: 28, headFt: 30 }]);
    expect(liftsOf(3, 3, 30, 10)).toEqual([{ fromFt: 3, toFt: 3, headFt: 0 }]);
  });

  it('puts the greatest head of the lifts that contain it on a point', () => {
    const lifts = liftsOf(0, 40, 20, 10);
    expect(lifts.map(({ fromFt, toFt }) => [fromFt, toFt])).toEqual([
      [0, 20],
      [10, 30],
      [20, 40],
    ]);
    expect([0, 9, 10, 15, 20, 25, 39, 40].map((point) => headInLiftsFt(point, lifts))).toEqual([
      20, 11, 20, 15, 20, 15, 1, 0,
    ]);
    expect(headInLiftsFt(-3, lifts)).toBe(23);
    expect(headInLiftsFt(41, lifts)).toBe(0);
  });

  it('covers the whole stack, each lift overlapping the one before, none too high', () => {
    const heights = fc.record({
      bottom: fc.double({ min: -20, max: 10, noNaN: true }),
      rise: fc.double({ min: 0, max: 200, noNaN: true }),
      overlap: fc.double({ min: 0, max: 20, noNaN: true }),
      more: fc.double({ min: 2, max: 30, noNaN: true }),
    });
    fc.assert(
      fc.property(heights, ({ bottom, rise, overlap, more }) => {
        const lifts = liftsOf(bottom, bottom + rise, overlap + more, overlap);
        expect(lifts[0]?.fromFt).toBeCloseTo(bottom, 12);
        expect(lifts.at(-1)?.toFt).toBeCloseTo(bottom + rise, 12);
        lifts.forEach(({ fromFt, headFt }, index) => {
          expect(headFt).toBeLessThanOrEqual(overlap + more + 1e-6);
          const before = lifts[index - 1];
          if (before) expect(before.toFt - fromFt).toBeCloseTo(overlap, 6);
        });
      }),
    );
  });

  it('is planned from the rule card’s feet, 10 without', () => {
    const sectional = {
      ...dwvSample,
      method: 'sectional' as const,
      ventTerminalFt: 60,
      rule: { acceptedMethods: ['sectional' as const] },
    };
    const answer = planDwv(dwvPlanInput.parse(sectional));
    expect(answer.lifts?.map(({ fromFt }) => fromFt)).toEqual([-2, 18, 38]);
    expect(answer).toMatchObject({
      fillLevelFt: 60,
      requiredLevelFt: 60,
      shortByFt: 0,
      notUnderTest: [],
      usable: true,
    });
    expect(answer.plugs[0]?.headFt).toBe(30);
    const five = {
      ...sectional,
      rule: { ...sectional.rule, headRule: { kind: 'above-highest-fitting' as const, feet: 5 } },
    };
    expect(planDwv(dwvPlanInput.parse(five)).lifts?.map(({ fromFt }) => fromFt)).toEqual([-2, 23, 48]);
  });
});
