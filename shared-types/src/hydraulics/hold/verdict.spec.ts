import { describe, expect, it } from 'vitest';
import { analyseRows, type Row, type WaterHoldGiven } from './hold.sample.js';

describe('verdicts, first that applies', () => {
  it.each<[string, string, Row[], Partial<WaterHoldGiven>]>([
    ['none', 'no reading', [], {}],
    ['none', 'no open reading', [[0, 120, 68, 'shut']], {}],
    [
      'below',
      'the last open reading under the minimum',
      [
        [0, 101],
        [1, 99],
      ],
      {},
    ],
    [
      'holding',
      'exactly at the minimum',
      [
        [0, 100],
        [1, 100],
      ],
      {},
    ],
    ['below', 'under the minimum though still settling', [[0, 99]], { settleMinutes: 60 }],
    [
      'settling',
      'no reading after the settle time',
      [
        [0, 120],
        [0.9, 116],
      ],
      { settleMinutes: 60 },
    ],
    [
      'too-soon',
      'one used reading',
      [
        [0, 120],
        [1, 116],
      ],
      { settleMinutes: 60 },
    ],
    [
      'too-soon',
      'a span a little short',
      [
        [0, 120],
        [0.24, 120],
      ],
      {},
    ],
    [
      'holding',
      'a span just long enough',
      [
        [0, 120],
        [0.25, 120],
      ],
      {},
    ],
    [
      'dropping',
      'two marks down',
      [
        [0, 120],
        [1, 118],
      ],
      {},
    ],
    [
      'holding',
      'one mark down: nobody can tell',
      [
        [0, 120],
        [1, 119],
      ],
      {},
    ],
    [
      'holding',
      'a rise of less than a mark',
      [
        [0, 120],
        [1, 120.5],
      ],
      {},
    ],
    [
      'slow-fall',
      'plastic, an increment in four hours',
      [
        [0, 120],
        [8, 118],
      ],
      { plastic: true },
    ],
    [
      'dropping',
      'plastic, an increment in less',
      [
        [0, 120],
        [7.5, 118],
      ],
      { plastic: true },
    ],
    [
      'dropping',
      'copper, however slow',
      [
        [0, 120],
        [20, 118],
      ],
      {},
    ],
    [
      'temperature',
      'air that cooled by ten degrees',
      [
        [0, 100, 70],
        [2, 97.83, 60],
      ],
      { medium: 'air', minimumPsi: 90 },
    ],
    [
      'dropping',
      'air that fell further than it cooled',
      [
        [0, 100, 70],
        [2, 95, 60],
      ],
      { medium: 'air', minimumPsi: 90 },
    ],
    [
      'temperature',
      'topped with air, explained by the air alone',
      [
        [0, 100, 70],
        [2, 97.83, 60],
      ],
      { medium: 'water-topped-with-air', minimumPsi: 90 },
    ],
    [
      'dropping',
      'sealed water, whatever the temperature',
      [
        [0, 100, 70],
        [2, 97.83, 60],
      ],
      { minimumPsi: 90 },
    ],
  ])('%s: %s', (verdict, _, rows, changes) => {
    expect(analyseRows(rows, changes).verdict).toBe(verdict);
  });
});

describe('numbers', () => {
  it('answers nulls and an empty series without an open reading', () => {
    expect(analyseRows([[0, 120, 68, 'shut']], { forecast: null })).toMatchObject({
      rawDropPsi: null,
      correctedDropPsi: null,
      slopePsiPerHour: null,
      marginPsiPerHour: null,
      series: [],
      settledAt: null,
      forecast: null,
      credibleDropPsi: 1,
    });
  });

  it('shows readings of the settle time and does not use them', () => {
    const answer = analyseRows(
      [
        [0, 120],
        [0.5, 115],
        [1, 113],
        [2, 113],
      ],
      { settleMinutes: 60 },
    );
    expect(answer.series.map(({ psi, used }) => [psi, used])).toEqual([
      [120, false],
      [115, false],
      [113, true],
      [113, true],
    ]);
    expect(answer).toMatchObject({ settledAt: '2027-03-02T16:00:00Z', rawDropPsi: 0, verdict: 'holding' });
  });

  it('answers instants in Z whatever the offset they came in', () => {
    const readings = [{ at: '2027-03-02T08:00:00-07:00', psi: 120, temperatureF: 68, gaugeValve: 'open' as const }];
    const answer = analyseRows([], { readings });
    expect(answer.series[0]?.at).toBe('2027-03-02T15:00:00Z');
  });

  it('corrects air to the first used reading, both ways for air over water', () => {
    // Computed: 100 psig, 70 → 60 °F at sea level is 97.8346 (P/T constant, 14.6959 psia), so that reading corrected back is 100.
    const air = analyseRows(
      [
        [0, 100, 70],
        [2, 97.8346, 60],
      ],
      { medium: 'air', minimumPsi: 90 },
    );
    expect(air.rawDropPsi).toBeCloseTo(2.1654, 4);
    expect(air.correctedDropPsi?.[0]).toBeCloseTo(0, 4);
    expect(air.slopePsiPerHour?.[0]).toBeCloseTo(0, 4);
    const topped = analyseRows(
      [
        [0, 100, 70],
        [2, 97.8346, 60],
      ],
      { medium: 'water-topped-with-air', minimumPsi: 90 },
    );
    expect(topped.correctedDropPsi?.[0]).toBeCloseTo(0, 4);
    expect(topped.correctedDropPsi?.[1]).toBeCloseTo(2.1654, 4);
    expect(topped.slopePsiPerHour?.[0]).toBeCloseTo(-2.1654 / 2, 4);
    expect(topped.series[1]?.correctedPsi[0]).toBeCloseTo(97.8346, 4);
    expect(topped.series[1]?.correctedPsi[1]).toBeCloseTo(100, 4);
  });

  it('does not correct a reading without a temperature, nor any when its reference has none', () => {
    const late = analyseRows(
      [
        [0, 100, 70],
        [2, 98, null],
      ],
      { medium: 'air', minimumPsi: 90 },
    );
    expect(late.correctedDropPsi).toEqual([2, 2]);
    const first = analyseRows(
      [
        [0, 100, null],
        [2, 98, 60],
      ],
      { medium: 'air', minimumPsi: 90 },
    );
    expect(first.correctedDropPsi).toEqual([2, 2]);
  });

  it('takes the air pressure from the site', () => {
    // engineersedge standard atmosphere, 5000 ft: 12.230 psia ± 0.012
    expect(Math.abs(analyseRows([], { elevationFt: 5000 }).patmPsi - 12.23)).toBeLessThan(0.012);
  });
});

describe('slope and margin', () => {
  it('is Theil–Sen’s, in psi per hour', () => {
    // Sen 1968 as used in SciPy's tests: slope 4 of these points; turned downward here, so that it is a fall
    const x = [1, 2, 3, 4, 10, 12, 18];
    const y = [9, 15, 19, 20, 45, 55, 78];
    const answer = analyseRows(
      x.map((hours, index) => [hours, 200 - (y[index] ?? 0)] as const),
      { minimumPsi: 50 },
    );
    expect(answer.slopePsiPerHour).toEqual([-4, -4]);
    // α 0.05 with 1.96: C = 13.05, N = 21: ranks 4 and 18, the slopes 26/7 and 35/8 published by Sen for α 0.07 (the ranks are the same)
    expect(answer.marginPsiPerHour).toBeCloseTo((35 / 8 - 26 / 7) / 2, 12);
  });

  it('is one increment over the span up to five readings', () => {
    const five = [0, 1, 2, 3, 4].map((hours) => [hours, hours % 2 ? 118 : 120] as const);
    // Alternating by two marks would be a pump-up each time on a 1 psi gauge; a 2 psi gauge sees noise.
    expect(analyseRows(five, { gauge: { incrementPsi: 2 } }).marginPsiPerHour).toBe(0.5);
    expect(analyseRows([...five, [5, 118]], { gauge: { incrementPsi: 2 } }).marginPsiPerHour).toBeGreaterThan(0.5);
  });

  it('is zero with one used reading', () => {
    expect(analyseRows([[0, 120]])).toMatchObject({ slopePsiPerHour: [0, 0], marginPsiPerHour: 0 });
  });
});
