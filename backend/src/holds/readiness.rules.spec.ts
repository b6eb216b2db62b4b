import { describe, expect, it } from 'vitest';
import { type CountedReading, lastCounted, readinessOf, requiredTests, type StandingTest } from './readiness.rules.js';

let count = 0;
function read(minute: number, pressurePsi: number | null, parts: Partial<CountedReading> = {}): CountedReading {
  count += 1;
  const at = new Date(Date.UTC(2027, 2, 2, 16, minute));
  const gaugeValve = pressurePsi === null ? null : 'open';
  return { id: `reading-${count}`, madeAt: at, receivedAt: at, pressurePsi, gaugeValve, struckAt: null, ...parts };
}

const water = (readings: CountedReading[], parts: Partial<StandingTest> = {}): StandingTest => ({
  unitNumber: 1,
  system: 'water',
  medium: 'water',
  minimumPsi: 100,
  ceilingPsi: 160,
  readings,
  ...parts,
});
const drain = (readings: CountedReading[]): StandingTest =>
  water(readings, { system: 'dwv', minimumPsi: null, ceilingPsi: null });
const wanted = requiredTests([1], ['dwv', 'water']);

describe('whether the tests of a visit are up', () => {
  it('names every system of every unit by unit', () => {
    expect(requiredTests([2, 1], ['dwv', 'water'])).toEqual([
      { unitNumber: 1, system: 'dwv' },
      { unitNumber: 1, system: 'water' },
      { unitNumber: 2, system: 'dwv' },
      { unitNumber: 2, system: 'water' },
    ]);
  });

  it('is so when each required system stands with a reading that counts, and names those readings', () => {
    const level = read(0, null);
    const last = read(10, 100);
    const readiness = readinessOf(wanted, [drain([level]), water([read(0, 130), last])]);
    expect(readiness).toEqual({ missing: [], overLimit: null, readingIds: [level.id, last.id] });
  });

  it('says of each missing one why', () => {
    const four = requiredTests([1, 2], ['dwv', 'water']);
    const { missing } = readinessOf(four, [
      drain([read(0, null, { struckAt: new Date() })]),
      water([read(0, 99.9)]),
      water([read(0, 120, { gaugeValve: 'shut' })], { unitNumber: 2 }),
    ]);
    expect(missing).toEqual([
      { unitNumber: 1, system: 'dwv', why: 'no-open-reading' },
      { unitNumber: 1, system: 'water', why: 'below-minimum' },
      { unitNumber: 2, system: 'dwv', why: 'no-test' },
      { unitNumber: 2, system: 'water', why: 'no-open-reading' },
    ]);
  });

  it('goes by the last reading with the valve open: a shut one after it tells nothing of the pipe, a struck one nothing at all', () => {
    const open = read(5, 90);
    const readings = [
      read(0, 130),
      open,
      read(20, 130, { gaugeValve: 'shut' }),
      read(30, 130, { struckAt: new Date() }),
    ];
    expect(lastCounted(water(readings))).toBe(open);
    expect(readinessOf(wanted, [water(readings)]).missing.at(-1)?.why).toBe('below-minimum');
  });

  it('puts a late arrival where it was made, and of two made at once takes the one that came later', () => {
    const late = read(1, 90, { receivedAt: new Date(Date.UTC(2027, 2, 2, 20)) });
    const last = read(9, 110);
    expect(lastCounted(water([last, late]))).toBe(last);
    const twin = read(9, 105, { receivedAt: new Date(Date.UTC(2027, 2, 2, 21)) });
    expect(lastCounted(water([twin, last]))).toBe(twin);
  });

  it('takes a system without a minimum at any reading', () => {
    expect(
      readinessOf([{ unitNumber: 1, system: 'water' }], [water([read(0, 1)], { minimumPsi: null })]).missing,
    ).toEqual([]);
  });

  it('warns of one over its lowest-rated part, whatever else is missing', () => {
    const { overLimit } = readinessOf(wanted, [water([read(0, 160.5)])]);
    expect(overLimit).toEqual({ unitNumber: 1, system: 'water', pressurePsi: 160.5, ceilingPsi: 160 });
    expect(readinessOf(wanted, [water([read(0, 160)])]).overLimit).toBeNull();
  });
});
