import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { airGaugePsiAt, atmospherePsi } from '../air.js';
import { analyseRows, codesOf, hoursOn, type Row, type WaterHoldGiven } from './hold.sample.js';

const window = (from: number, to: number, rest: Partial<NonNullable<WaterHoldGiven['forecast']>> = {}) => ({
  from: hoursOn(from),
  to: hoursOn(to),
  ...rest,
});
const forecastOf = (rows: readonly Row[], changes: Partial<WaterHoldGiven>) => {
  const { forecast } = analyseRows(rows, changes);
  if (!forecast) throw new Error('no forecast');
  return forecast;
};

describe('trend', () => {
  const rows: Row[] = [
    [0, 120],
    [4, 119],
  ];

  it('carries the slope on and widens with the hours', () => {
    // By hand: slope −1/4 psi/h, margin 1 psi over 4 h = 1/4 psi/h; 10 h and 12 h after the last reading.
    const forecast = forecastOf(rows, { forecast: window(14, 16) });
    expect(forecast).toMatchObject({ basis: 'trend', holdsThrough: 'yes', topUpToPsi: null, reasons: [] });
    expect(forecast.from).toEqual({ low: 116.5 - 2.5 - 0.5, mid: 116.5, high: 116.5 + 2.5 + 0.5 });
    expect(forecast.to).toEqual({ low: 116 - 3 - 0.5, mid: 116, high: 116 + 3 + 0.5 });
  });

  it('is trusted for four times its span, no longer', () => {
    expect(forecastOf(rows, { forecast: window(14, 20) }).basis).toBe('trend');
    const far = forecastOf(rows, { forecast: window(14, 20.01) });
    expect(far).toMatchObject({
      basis: 'temperature-only',
      from: { low: 118, mid: 119, high: 120 },
      holdsThrough: 'maybe',
    });
    expect(codesOf(far.reasons)).toContain('temperature-only');
  });

  it('does not look back: a window that has begun starts from the last reading', () => {
    expect(forecastOf(rows, { forecast: window(1, 4) }).from).toEqual({ low: 118.5, mid: 119, high: 119.5 });
  });

  it('says no where even the best is too low, maybe between', () => {
    expect(
      forecastOf(
        [
          [0, 110],
          [4, 104],
        ],
        { forecast: window(14, 16) },
      ).holdsThrough,
    ).toBe('no');
    expect(
      forecastOf(
        [
          [0, 104],
          [4, 103],
        ],
        { forecast: window(14, 16) },
      ).holdsThrough,
    ).toBe('maybe');
    // By hand: −1/2 psi/h, margin 1/4; high is 98 + 2.5 + 0.5 at 14 h and 95 + 4 + 0.5 at 20 h: one end too low is enough.
    const rowsOfOneEnd: Row[] = [
      [0, 105],
      [4, 103],
    ];
    const oneEnd = forecastOf(rowsOfOneEnd, { forecast: window(14, 20) });
    expect([oneEnd.from.high, oneEnd.to.high, oneEnd.holdsThrough]).toEqual([101, 99.5, 'no']);
  });

  it('is none without a window or a used reading', () => {
    expect(analyseRows(rows).forecast).toBeNull();
    expect(analyseRows([[0, 120]], { settleMinutes: 60, forecast: window(14, 16) }).forecast).toBeNull();
    expect(analyseRows([[0, 120, 68, 'shut']], { forecast: window(14, 16) }).forecast).toBeNull();
  });
});

describe('temperature', () => {
  const air = { medium: 'air' as const, minimumPsi: 50, gauge: { incrementPsi: 1 } };

  it('takes air to the forecast temperature', () => {
    // Computed: 100 psig, 70 → 60 °F at sea level: 97.8346
    const forecast = forecastOf(
      [
        [0, 100, 70],
        [8, 100, 70],
      ],
      { ...air, forecast: window(14, 16, { temperatureF: 60 }) },
    );
    expect(forecast.from.mid).toBeCloseTo(97.8346, 4);
  });

  it('takes it back from the temperature of the first used reading', () => {
    // 100 psig at 70 °F read 97.8346 at 60 °F: nothing was lost, so that at 70 °F it stands at 100 again.
    const forecast = forecastOf(
      [
        [0, 100, 70],
        [8, 97.8346, 60],
      ],
      { ...air, forecast: window(14, 16, { temperatureF: 70 }) },
    );
    expect(forecast.to.mid).toBeCloseTo(100, 3);
  });

  it('without a forecast temperature stays at the last reading’s', () => {
    expect(
      forecastOf(
        [
          [0, 100, 70],
          [8, 97.8346, 60],
        ],
        { ...air, forecast: window(14, 16) },
      ).to.mid,
    ).toBeCloseTo(97.8346, 3);
  });

  it('does not take back what was not corrected', () => {
    const forecast = window(14, 16, { temperatureF: 40 });
    expect(
      forecastOf(
        [
          [0, 100, 70],
          [8, 100, null],
        ],
        { ...air, forecast },
      ).to.mid,
    ).toBe(100);
    expect(
      forecastOf(
        [
          [0, 100, null],
          [8, 100, 70],
        ],
        { ...air, forecast },
      ).to.mid,
    ).toBe(100);
  });

  it('leaves sealed water where it is, and spans both over water', () => {
    const forecast = window(14, 16, { temperatureF: 60 });
    const rows: Row[] = [
      [0, 100, 70],
      [8, 100, 70],
    ];
    expect(forecastOf(rows, { minimumPsi: 50, forecast }).to.mid).toBe(100);
    const topped = forecastOf(rows, { ...air, medium: 'water-topped-with-air', forecast });
    // Margin 1 psi in 8 h, 8 h on, and half a mark: 1.5 either side of 97.8346 … 100
    expect(topped.to.low).toBeCloseTo(97.8346 - 1.5, 4);
    expect(topped.to.high).toBeCloseTo(100 + 1.5, 4);
    expect(topped.to.mid).toBeCloseTo((97.8346 + 100) / 2, 4);
  });
});

describe('top up to', () => {
  it('the smallest mark whose middle stays above the minimum at both ends', () => {
    // By hand: slope −1/4 psi/h, 12 h to the end: 3 psi lost; 100 + 3 + half a mark = 103.5, so 104.
    const forecast = forecastOf(
      [
        [0, 103],
        [4, 102],
      ],
      { forecast: window(14, 16) },
    );
    expect(forecast).toMatchObject({ holdsThrough: 'maybe', topUpToPsi: 104, reasons: [] });
  });

  it('is for finding the leak first where it drops', () => {
    expect(
      forecastOf(
        [
          [0, 110],
          [4, 102],
        ],
        { forecast: window(14, 16) },
      ),
    ).toMatchObject({ topUpToPsi: null, reasons: [{ code: 'find-the-leak' }] });
  });

  it('is to read again where it stands high enough and only the spread is wide', () => {
    const forecast = forecastOf([[0, 103]], { forecast: window(14, 16) });
    expect(forecast).toMatchObject({ basis: 'temperature-only', holdsThrough: 'maybe', topUpToPsi: null });
    expect(codesOf(forecast.reasons)).toEqual(['temperature-only', 'read-again']);
  });

  it('is not above the weakest part', () => {
    const rows: Row[] = [
      [0, 103],
      [4, 102],
    ];
    const at = (ceilingPsi: number) => forecastOf(rows, { ceilingPsi, forecast: window(14, 16) });
    expect(at(104).topUpToPsi).toBe(104);
    expect(at(103)).toMatchObject({
      topUpToPsi: null,
      reasons: [{ code: 'over-ceiling', params: { topUpToPsi: 104, ceilingPsi: 103 } }],
    });
  });

  it('is not so high that a warm afternoon breaks the weakest part', () => {
    const cold: Partial<WaterHoldGiven> = {
      medium: 'air',
      minimumPsi: 100,
      forecast: window(14, 16, { temperatureF: 41, hottestF: 85 }),
    };
    const rows: Row[] = [
      [0, 102, 41],
      [8, 101, 41],
    ];
    // 8 h on, −1/8 psi/h: 100 + 1 + half a mark, so 102; at 85 °F that is 112.27 (P/T constant, sea level)
    expect(forecastOf(rows, { ...cold, ceilingPsi: 113 }).topUpToPsi).toBe(102);
    const refused = forecastOf(rows, { ...cold, ceilingPsi: 112 });
    expect(refused).toMatchObject({ topUpToPsi: null, reasons: [{ code: 'over-ceiling-when-warm' }] });
    expect(refused.reasons[0]?.params.warmPsi).toBeCloseTo((102 + 14.6959) * (544.67 / 500.67) - 14.6959, 9);
  });

  it('104 psig of air at 41 °F passes a ceiling of 114 at 85 °F', () => {
    // Computed, sea level: 114.4 psig
    expect(airGaugePsiAt(104, 41, 85, atmospherePsi(0))).toBeCloseTo(114.4, 1);
  });
});

describe('properties', () => {
  const given = fc.record({
    medium: fc.constantFrom('water' as const, 'water-topped-with-air' as const, 'air' as const),
    first: fc.integer({ min: 60, max: 130 }),
    fall: fc.integer({ min: 0, max: 1 }),
    spanHours: fc.integer({ min: 1, max: 12 }),
    ahead: fc.integer({ min: 1, max: 40 }),
    firstF: fc.integer({ min: 20, max: 95 }),
    lastF: fc.integer({ min: 20, max: 95 }),
    thenF: fc.integer({ min: 0, max: 95 }),
    elevationFt: fc.integer({ min: 0, max: 9000 }),
  });
  type Given = typeof given extends fc.Arbitrary<infer T> ? T : never;
  const analysed = (
    { medium, first, fall, spanHours, ahead, firstF, lastF, thenF, elevationFt }: Given,
    lastPsi = first - fall,
  ) =>
    analyseRows(
      [
        [0, first, firstF],
        [spanHours, lastPsi, lastF],
      ],
      {
        medium,
        elevationFt,
        forecast: window(spanHours + ahead, spanHours + ahead + 2, { temperatureF: thenF }),
      },
    );

  it('low is never above mid, nor mid above high', () => {
    fc.assert(
      fc.property(given, (input) => {
        for (const end of [analysed(input).forecast?.from, analysed(input).forecast?.to]) {
          expect(end?.low).toBeLessThanOrEqual(end?.mid ?? -Infinity);
          expect(end?.mid).toBeLessThanOrEqual(end?.high ?? -Infinity);
        }
      }),
    );
  });

  it('what it says to pump to is just enough: the forecast of a system standing there keeps the minimum, one mark lower does not', () => {
    let advised = 0;
    fc.assert(
      fc.property(given, ({ ...input }) => {
        // One reading has no slope: the forecast of a pumped-up system can be asked for again by reading it there.
        const single = (psi: number) =>
          analyseRows([[0, psi, input.firstF]], {
            medium: input.medium,
            elevationFt: input.elevationFt,
            forecast: window(input.ahead, input.ahead + 2, { temperatureF: input.thenF }),
          });
        const target = single(input.first).forecast?.topUpToPsi ?? null;
        if (target === null) return;
        advised += 1;
        const mids = (psi: number) => [single(psi).forecast?.from.mid ?? 0, single(psi).forecast?.to.mid ?? 0];
        expect(target).toBeGreaterThan(input.first);
        expect(Math.min(...mids(target)) - 0.5).toBeGreaterThanOrEqual(100 - 1e-6);
        if (target - 1 > input.first) expect(Math.min(...mids(target - 1)) - 0.5).toBeLessThan(100);
        expect(codesOf(single(target).forecast?.reasons ?? [])).toEqual(['temperature-only', 'read-again']);
      }),
    );
    expect(advised).toBeGreaterThan(0);
  });

  it('the same with a trend, worked back through slope and temperature', () => {
    let advised = 0;
    fc.assert(
      fc.property(given, (input) => {
        const { forecast, slopePsiPerHour, patmPsi, verdict } = analysed(input);
        const target = forecast?.topUpToPsi ?? null;
        if (
          input.medium === 'water-topped-with-air' ||
          !forecast ||
          forecast.basis !== 'trend' ||
          target === null ||
          !slopePsiPerHour
        )
          return;
        advised += 1;
        expect(verdict).not.toBe('dropping');
        // Independent of the way there: what the target comes to, by P/T and the answered slope alone.
        const later = (psi: number, hours: number) => {
          if (input.medium === 'water') return psi + slopePsiPerHour[0] * hours;
          const atFirst = airGaugePsiAt(psi, input.lastF, input.firstF, patmPsi) + slopePsiPerHour[0] * hours;
          return airGaugePsiAt(atFirst, input.firstF, input.thenF, patmPsi);
        };
        const least = (psi: number) => Math.min(later(psi, input.ahead), later(psi, input.ahead + 2)) - 0.5;
        expect(least(target)).toBeGreaterThanOrEqual(100 - 1e-6);
        if (target - 1 > input.first - input.fall) expect(least(target - 1)).toBeLessThan(100);
      }),
    );
    expect(advised).toBeGreaterThan(0);
  });
});
