import { describe, expect, it } from 'vitest';
import { holdAnalysis } from '../hold.contract.js';
import { analyseLevels, analyseRows, codesOf, hoursOn, type Row, type WaterHoldGiven } from './hold.sample.js';

const window = (rest: Partial<NonNullable<WaterHoldGiven['forecast']>> = {}, to = 7.9) => ({
  from: hoursOn(Math.min(6, to)),
  to: hoursOn(to),
  ...rest,
});
const rows: Row[] = [
  [0, 120, 68],
  [1, 120, 68],
];
const codes = (given: readonly Row[], changes: Partial<WaterHoldGiven> = {}) =>
  codesOf(analyseRows(given, changes).cautions);
const topped = { medium: 'water-topped-with-air' as const };

describe('cautions of a test log', () => {
  it('a sound, finished water test has only the standing two', () => {
    expect(codes(rows)).toEqual(['under-pressure', 'local-code']);
    expect(
      codesOf(
        analyseLevels([
          [0, 1],
          [1, 1],
        ]).cautions,
      ),
    ).toEqual(['local-code']);
  });

  it.each<[string, readonly Row[], Partial<WaterHoldGiven>, boolean]>([
    [
      'over-ceiling',
      [
        [0, 120],
        [1, 147],
      ],
      { ceilingPsi: 146 },
      true,
    ],
    ['over-ceiling', [[0, 146]], { ceilingPsi: 146 }, false],
    [
      'over-ceiling',
      [
        [0, 120],
        [1, 150, 68, 'shut'],
      ],
      { ceilingPsi: 146 },
      false,
    ],
    ['compressed-air', rows, topped, true],
    ['compressed-air', rows, { medium: 'air' }, true],
    [
      'shut-gauge',
      [
        [0, 120],
        [1, 120, 68, 'shut'],
      ],
      {},
      true,
    ],
    [
      'shut-gauge',
      [
        [0, 120, 68, 'shut'],
        [1, 120],
      ],
      {},
      false,
    ],
    ['freeze-risk', rows, { forecast: window({ coldestF: 36 }) }, true],
    ['freeze-risk', rows, { forecast: window({ coldestF: 36.5 }) }, false],
    ['freeze-risk', rows, { forecast: window({ coldestF: 32 }) }, false],
    ['freeze', rows, { forecast: window({ coldestF: 32 }) }, true],
    ['freeze', rows, { forecast: window({ temperatureF: 20 }) }, true],
    ['freeze', rows, { forecast: window({ temperatureF: 20, coldestF: 40 }) }, false],
    ['freeze', [], { forecast: window({ coldestF: 20 }) }, true],
    ['sealed-water-warms', rows, { forecast: window({ temperatureF: 69 }) }, true],
    ['sealed-water-warms', rows, { forecast: window({ temperatureF: 60, hottestF: 80 }) }, true],
    ['sealed-water-warms', rows, { forecast: window({ temperatureF: 68 }) }, false],
    ['sealed-water-warms', rows, { ...topped, forecast: window({ temperatureF: 90 }) }, false],
    [
      'water-temperature',
      [
        [0, 120, 68],
        [1, 120, 65.9],
      ],
      {},
      true,
    ],
    [
      'water-temperature',
      [
        [0, 120, 68],
        [1, 120, 66],
      ],
      {},
      false,
    ],
    [
      'water-temperature',
      [
        [0, 120, 68],
        [1, 120, 50],
      ],
      topped,
      false,
    ],
    ['air-dissolves', rows, { ...topped, forecast: window({}, 8) }, true],
    ['air-dissolves', rows, { ...topped, forecast: window({}, 7.9) }, false],
    ['air-dissolves', rows, { medium: 'air', forecast: window({}, 20) }, false],
    [
      'settling',
      [
        [0, 120],
        [0.5, 118],
      ],
      { settleMinutes: 60 },
      true,
    ],
    [
      'settling',
      [
        [0, 120],
        [1, 118],
      ],
      { settleMinutes: 60 },
      false,
    ],
    ['temperature-missing', [[0, 120, null]], topped, true],
    ['temperature-missing', [[0, 120, null]], {}, false],
    ['one-reading', [[0, 120]], {}, true],
    ['one-reading', rows, {}, false],
    [
      'many-top-ups',
      [
        [0, 100],
        [1, 110],
        [2, 120],
      ],
      {},
      true,
    ],
    [
      'many-top-ups',
      [
        [0, 100],
        [1, 110],
      ],
      {},
      false,
    ],
    [
      'close-the-main',
      [
        [0, 103],
        [4, 102],
      ],
      { forecast: window({}, 16) },
      true,
    ],
    ['close-the-main', rows, { forecast: window() }, false],
  ])('%s', (code, given, changes, isRaised) => {
    expect(codes(given, changes).includes(code)).toBe(isRaised);
  });

  it('carry the numbers that their words need', () => {
    const over = analyseRows([[0, 150]], { ceilingPsi: 146 }).cautions[0];
    expect(over).toEqual({ code: 'over-ceiling', params: { psi: 150, ceilingPsi: 146 } });
    const settling = analyseRows([[0, 120]], { settleMinutes: 90 }).cautions.find(({ code }) => code === 'settling');
    expect(settling?.params).toEqual({ settledAt: '2027-03-02T16:30:00Z' });
    const unlike = analyseRows([
      [0, 120, 68],
      [1, 120, 50],
    ]).cautions.find(({ code }) => code === 'water-temperature');
    expect(unlike?.params).toEqual({ spreadF: 18, temperatureF: 68 });
  });

  it('stay within the contract', () => {
    const answer = analyseRows(
      [
        [0, 103],
        [4, 102],
      ],
      { ...topped, ceilingPsi: 101, settleMinutes: 0, forecast: window({ coldestF: 30, hottestF: 90 }, 16) },
    );
    expect(holdAnalysis.parse(answer)).toEqual(answer);
  });
});
