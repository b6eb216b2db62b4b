import { describe, expect, it } from 'vitest';
import { holdAnalysis } from '../hold.contract.js';
import { analyseLevels, codesOf, hoursOn } from './hold.sample.js';

describe('a level below the rim', () => {
  it('that stays is holding', () => {
    // 15 min: IRC P2503.5.1
    expect(
      analyseLevels([
        [0, 0.5],
        [0.25, 0.5],
      ]),
    ).toMatchObject({ verdict: 'holding', rawDropIn: 0, correctedDropIn: [0, 0], credibleDropIn: 0.125 });
  });

  it('that sinks is a positive drop and a negative slope', () => {
    const answer = analyseLevels([
      [0, 0.5],
      [1, 0.75],
    ]);
    expect(answer).toMatchObject({
      verdict: 'dropping',
      rawDropIn: 0.25,
      correctedDropIn: [0.25, 0.25],
      slopeInPerHour: [-0.25, -0.25],
      marginInPerHour: 0.125,
    });
    expect(answer.series).toEqual([
      { at: '2027-03-02T15:00:00Z', levelIn: 0.5, correctedIn: [0.5, 0.5], used: true },
      { at: '2027-03-02T16:00:00Z', levelIn: 0.75, correctedIn: [0.75, 0.75], used: true },
    ]);
  });

  it('below once it fell more than allowed from the first used reading', () => {
    expect(
      analyseLevels([
        [0, 0],
        [1, 0.5],
      ]).verdict,
    ).toBe('dropping');
    expect(
      analyseLevels([
        [0, 0],
        [1, 0.625],
      ]).verdict,
    ).toBe('below');
    expect(
      analyseLevels(
        [
          [0, 0],
          [0.5, 0.75],
        ],
        { settleMinutes: 60 },
      ).verdict,
    ).toBe('settling');
  });

  it('that rises by more than an increment was filled up', () => {
    expect(
      analyseLevels([
        [0, 1],
        [1, 0.5],
        [2, 0.5],
      ]),
    ).toMatchObject({ topUps: 1, toppedUpAt: '2027-03-02T16:00:00Z', rawDropIn: 0 });
    expect(
      analyseLevels([
        [0, 1],
        [1, 0.875],
      ]).topUps,
    ).toBe(0);
  });

  it('is forecast in inches, low being the lower water', () => {
    // By hand: 1/8 in lost in 2 h, margin the same; 2 and 4 h on, half an increment beside.
    const { forecast } = analyseLevels(
      [
        [0, 0.5],
        [2, 0.625],
      ],
      { forecast: { from: hoursOn(4), to: hoursOn(6) } },
    );
    expect(forecast).toMatchObject({
      basis: 'trend',
      topUpToIn: null,
      from: { low: 0.9375, mid: 0.75, high: 0.5625 },
      to: { low: 1.1875, mid: 0.875, high: 0.5625 },
    });
    expect(forecast?.holdsThrough).toBe('maybe');
  });

  it('gives no number to fill to, and says what to do first', () => {
    const { forecast } = analyseLevels(
      [
        [0, 0],
        [2, 0.5],
      ],
      { forecast: { from: hoursOn(4), to: hoursOn(6) } },
    );
    expect(forecast).toMatchObject({ topUpToIn: null });
    expect(codesOf(forecast?.reasons ?? [])).toEqual(['find-the-leak']);
  });

  it('moves with temperature: said beyond five degrees', () => {
    expect(
      codesOf(
        analyseLevels([
          [0, 1, 50],
          [1, 1, 55],
        ]).cautions,
      ),
    ).not.toContain('level-moves-with-temperature');
    expect(
      codesOf(
        analyseLevels([
          [0, 1, 50],
          [1, 1, 55.1],
        ]).cautions,
      ),
    ).toContain('level-moves-with-temperature');
  });

  it('fits its own contract and no other', () => {
    const answer = analyseLevels(
      [
        [0, 0],
        [2, 0.125],
      ],
      { forecast: { from: hoursOn(4), to: hoursOn(6) } },
    );
    expect(holdAnalysis.parse(answer)).toEqual(answer);
    expect(Object.is(answer.series[0]?.levelIn, 0)).toBe(true);
  });
});
