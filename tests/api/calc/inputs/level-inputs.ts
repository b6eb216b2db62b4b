import fc from 'fast-check';
import type { LevelRequest } from '../second/level-log.js';
import { maybe } from './measures.js';

const firstMs = Date.parse('2027-03-02T15:00:00Z');
const isoAt = (minutes: number) => new Date(firstMs + minutes * 60_000).toISOString();

const step = fc.record({
  gap: fc.oneof(fc.constantFrom(5, 15), fc.integer({ min: 1, max: 300 })),
  eighths: fc.oneof(
    { weight: 5, arbitrary: fc.integer({ min: -1, max: 2 }) },
    { weight: 1, arbitrary: fc.integer({ min: -20, max: 6 }) },
  ),
  temperatureF: maybe(fc.integer({ min: 45, max: 60 })),
});

/** Any valid log of a DWV test: never above the rim. */
export const levelInputs: fc.Arbitrary<LevelRequest> = fc
  .record({
    startEighths: fc.integer({ min: 0, max: 60 }),
    steps: fc.oneof(fc.array(step, { maxLength: 5 }), fc.array(step, { minLength: 6, maxLength: 14 })),
    incrementIn: fc.constantFrom(0.0625, 0.125, 0.25, 0.5, 1 / 25.4),
    maximumFallIn: fc.integer({ min: 0, max: 24 }).map((n) => n / 8),
    holdMinutes: fc.constantFrom(15, 60),
    asked: fc.option(fc.tuple(fc.integer({ min: -60, max: 1200 }), fc.integer({ min: 0, max: 240 })), { freq: 4 }),
  })
  .map(({ startEighths, steps, incrementIn, maximumFallIn, holdMinutes, asked }) => {
    let minutes = 0;
    let eighths = startEighths;
    const readings = steps.map(({ gap, eighths: fall, temperatureF }) => {
      minutes += gap;
      eighths = Math.max(0, eighths + fall);
      return { at: isoAt(minutes), levelIn: eighths / 8, temperatureF };
    });
    const forecast = asked && { from: isoAt(minutes + asked[0]), to: isoAt(minutes + asked[0] + asked[1]) };
    return { readings, gauge: { incrementIn }, maximumFallIn, holdMinutes, forecast };
  });
