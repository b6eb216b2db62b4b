import { describe, expect, it } from 'vitest';
import { checkReading, isLevelTest, type TypedReading } from './reading.rules.js';

const water = { system: 'water', medium: 'water', gauge: { rangePsi: 200 } } as const;
const drain = { system: 'dwv', medium: 'water', gauge: null } as const;
const drainByAir = { system: 'dwv', medium: 'air', gauge: { rangePsi: 15 } } as const;

describe('what a test is read with', () => {
  it('is a tape for water standing in a drain and a gauge for all else', () => {
    expect([water, drain, drainByAir].map(isLevelTest)).toEqual([false, true, false]);
    expect(isLevelTest({ system: 'water', medium: 'water-topped-with-air' })).toBe(false);
  });

  it.each([
    [water, { pressurePsi: 120, gaugeValve: 'open' }],
    [water, { pressurePsi: 0, gaugeValve: 'shut' }],
    [water, { pressurePsi: 200, gaugeValve: 'open', levelIn: null }],
    [drain, { levelIn: 0 }],
    [drain, { levelIn: 3.5, pressurePsi: null, gaugeValve: null }],
    [drainByAir, { pressurePsi: 5, gaugeValve: 'open' }],
  ] as const)('takes what fits (%#)', (test, reading) => {
    expect(() => checkReading(test, reading)).not.toThrow();
  });

  it.each<[typeof water | typeof drain | typeof drainByAir, TypedReading, Record<string, string>]>([
    [water, {}, { pressurePsi: 'required', gaugeValve: 'required' }],
    [water, { pressurePsi: 100 }, { gaugeValve: 'required' }],
    [water, { pressurePsi: 100, gaugeValve: 'open', levelIn: 1 }, { levelIn: 'not-for-a-gauge' }],
    [drain, {}, { levelIn: 'required' }],
    [drain, { levelIn: 1, gaugeValve: 'open' }, { gaugeValve: 'not-for-a-level' }],
    [drain, { pressurePsi: 3 }, { levelIn: 'required', pressurePsi: 'not-for-a-level' }],
    [drainByAir, { levelIn: 4 }, { pressurePsi: 'required', gaugeValve: 'required', levelIn: 'not-for-a-gauge' }],
  ])('names every field that does not fit (%#)', (test, reading, fields) => {
    expect(() => checkReading(test, reading)).toThrow(expect.objectContaining({ code: 'bad-input', fields }));
  });

  it('refuses what the gauge could not have shown, at its place in the input', () => {
    expect(() => checkReading(water, { pressurePsi: 200.5, gaugeValve: 'open' }, 'readings.2.')).toThrow(
      expect.objectContaining({
        code: 'reading-out-of-gauge',
        params: { rangePsi: 200, pressurePsi: 200.5 },
        fields: { 'readings.2.pressurePsi': 'above-gauge-range' },
      }),
    );
  });
});
