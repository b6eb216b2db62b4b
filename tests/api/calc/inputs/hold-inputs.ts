import fc from 'fast-check';
import type { HoldReading, HoldRequest } from '../second/hold.input.js';
import { media } from '../second/water.input.js';
import { elevationFt, increment, maybe, orAbsent } from './measures.js';

const firstMs = Date.parse('2027-03-02T15:00:00Z');
/** Minutes to the next reading: quarter hours, odd ones, and nights. */
const gapMinutes = fc.oneof(fc.constantFrom(15, 30, 60), fc.integer({ min: 1, max: 240 }), fc.constantFrom(720, 960));
const isoAt = (minutes: number) => new Date(firstMs + minutes * 60_000).toISOString();

/** What happens between two readings: mostly little, a steady loss, a temperature swing, a pump-up now and then. */
const change = fc.oneof(
  { weight: 4, arbitrary: fc.integer({ min: -1, max: 1 }) },
  { weight: 4, arbitrary: fc.integer({ min: -4, max: 0 }) },
  { weight: 1, arbitrary: fc.integer({ min: 0, max: 12 }) },
);
const step = fc.record({
  gapMinutes,
  change,
  half: fc.boolean(),
  warmer: fc.integer({ min: -8, max: 8 }),
  isKnown: fc.integer({ min: 0, max: 14 }).map((n) => n > 0),
  isShut: fc.integer({ min: 0, max: 3 }).map((n) => n === 0),
  /** What only the gauge and its hose lose while they are shut off. */
  gaugeLoss: fc.integer({ min: 0, max: 5 }),
});

const log = fc
  .record({
    startPsi: fc.integer({ min: 20, max: 140 }),
    startF: fc.integer({ min: 30, max: 95 }),
    follows: fc.boolean(),
    steps: fc.oneof(
      fc.array(step, { maxLength: 4 }),
      fc.array(step, { minLength: 5, maxLength: 14 }),
      // nobody touches the valve: long series for the Sen interval
      fc.array(
        step.map((each) => ({ ...each, isShut: false, change: Math.min(0, each.change) })),
        { minLength: 6, maxLength: 20 },
      ),
    ),
  })
  .map(({ startPsi, startF, follows, steps }) => {
    let minutes = 0;
    let at = startPsi;
    let temperature = startF;
    return steps.map((each): HoldReading => {
      minutes += each.gapMinutes;
      // where the pressure goes with the temperature, as sealed air at sea level does, read to half a psi
      const warmed = follows ? Math.round(((at + 14.7) * each.warmer * 2) / (temperature + 459.67)) / 2 : 0;
      at = Math.max(8, at + warmed + each.change * (each.half ? 0.5 : 1) * (follows ? 0.5 : 1));
      temperature += each.warmer;
      const temperatureF = each.isKnown ? temperature : null;
      const seen = each.isShut ? at - each.gaugeLoss : at;
      return { at: isoAt(minutes), psi: seen, temperatureF, gaugeValve: each.isShut ? 'shut' : 'open' };
    });
  });

const forecast = fc.record({
  lead: fc.oneof(fc.integer({ min: -60, max: 300 }), fc.integer({ min: 0, max: 2000 })),
  length: fc.integer({ min: 0, max: 240 }),
  temperatureF: maybe(fc.integer({ min: 20, max: 100 })),
  coldestF: maybe(fc.integer({ min: 15, max: 45 })),
  hottestF: maybe(fc.integer({ min: 60, max: 115 })),
});

/** Any valid log of a line under pressure, with and without a forecast. */
export const holdInputs: fc.Arbitrary<HoldRequest> = fc
  .record({
    medium: fc.constantFrom(...media),
    elevationFt,
    below: fc.oneof(fc.integer({ min: -6, max: 1 }), fc.integer({ min: -30, max: 10 })),
    over: maybe(fc.oneof(fc.integer({ min: -3, max: 12 }), fc.integer({ min: -20, max: 80 }))),
    holdMinutes: fc.constantFrom(15, 15, 30, 60, 240),
    settleMinutes: orAbsent(fc.constantFrom(0, 30, 60, 180)),
    plastic: orAbsent(fc.boolean()),
    gauge: fc.record({ incrementPsi: increment }),
    readings: log,
    asked: fc.option(forecast, { freq: 5 }),
  })
  .map(({ below, over, asked, ...given }) => {
    const final = given.readings.at(-1);
    const lastMs = final ? Date.parse(final.at) : firstMs;
    const minutes = (lastMs - firstMs) / 60_000;
    const span = asked && { from: isoAt(minutes + asked.lead), to: isoAt(minutes + asked.lead + asked.length) };
    const { lead: _lead, length: _length, ...air } = asked ?? {};
    return {
      ...given,
      minimumPsi: Math.max(1, (final?.psi ?? 50) + below),
      ceilingPsi: over == null ? over : Math.max(1, (final?.psi ?? 50) + over),
      forecast: span && { ...span, ...air },
    };
  });
