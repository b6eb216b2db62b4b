import { describe, expect, it } from 'vitest';
import { analyseRows, codesOf } from './hold.sample.js';

describe('pumped up', () => {
  it('more than one increment up, and everything starts anew there', () => {
    const answer = analyseRows([
      [0, 120],
      [1, 110],
      [2, 121],
      [3, 121],
    ]);
    expect(answer).toMatchObject({ topUps: 1, toppedUpAt: '2027-03-02T17:00:00Z', rawDropPsi: 0, verdict: 'holding' });
    expect(answer.series.map(({ psi }) => psi)).toEqual([121, 121]);
  });

  it('not by one increment', () => {
    expect(
      analyseRows([
        [0, 120],
        [1, 121],
      ]),
    ).toMatchObject({ topUps: 0, toppedUpAt: null });
    expect(
      analyseRows([
        [0, 120],
        [1, 121.01],
      ]).topUps,
    ).toBe(1);
  });

  it('not by warm air', () => {
    // Computed: 5 psig, 70 → 80 °F at sea level is 5.3719, nearly four marks of 0.1 psi, all of them the sun's
    const warm = { medium: 'air' as const, minimumPsi: 4, gauge: { incrementPsi: 0.1 } };
    expect(
      analyseRows(
        [
          [0, 5, 70],
          [1, 5.3719, 80],
        ],
        warm,
      ).topUps,
    ).toBe(0);
    expect(
      analyseRows(
        [
          [0, 5, 70],
          [1, 5.3719, 70],
        ],
        warm,
      ).topUps,
    ).toBe(1);
  });

  it('over water the smaller rise counts', () => {
    const topped = { medium: 'water-topped-with-air' as const };
    // 100 psig, 60 → 70 °F: air alone would stand at 102.21 (P/T constant); the smaller rise is the air rule's.
    expect(
      analyseRows(
        [
          [0, 100, 60],
          [1, 103, 70],
        ],
        topped,
      ).topUps,
    ).toBe(0);
    // Cooled air that reads higher was pumped by either rule; water's own rise is the smaller one.
    expect(
      analyseRows(
        [
          [0, 100, 70],
          [1, 100.9, 60],
        ],
        topped,
      ).topUps,
    ).toBe(0);
    expect(
      analyseRows(
        [
          [0, 100, 70],
          [1, 101.1, 60],
        ],
        topped,
      ).topUps,
    ).toBe(1);
  });

  it('compares open readings only', () => {
    expect(
      analyseRows([
        [0, 120],
        [1, 100, 68, 'shut'],
        [2, 120],
      ]).topUps,
    ).toBe(0);
    expect(
      analyseRows([
        [0, 120, 68, 'shut'],
        [1, 140],
      ]).topUps,
    ).toBe(0);
  });

  it('starts the settle time again, and twice is a habit that hides a leak', () => {
    const answer = analyseRows(
      [
        [0, 120],
        [1, 110],
        [1.5, 120],
        [2.5, 112],
        [3, 120],
        [3.5, 119],
      ],
      { settleMinutes: 60 },
    );
    expect(answer).toMatchObject({
      topUps: 2,
      toppedUpAt: '2027-03-02T18:00:00Z',
      settledAt: '2027-03-02T19:00:00Z',
      verdict: 'settling',
    });
    expect(codesOf(answer.cautions)).toEqual(expect.arrayContaining(['many-top-ups', 'settling']));
  });
});
