import { beforeEach, describe, expect, it } from 'vitest';
import { eveningOf, keepTemperatures, noTemperatures, readTemperatures, temperatureOf } from './kept-temperatures';

const zone = 'America/Denver';
const typed = { now: '61', window: '47', coldest: '41,5' };
/** Tue, Apr 14, 2026, 5:10 pm in Denver (UTC−6, IANA tz). */
const evening = new Date('2026-04-14T23:10:00Z');
const later = (hours: number): Date => new Date(evening.getTime() + hours * 3_600_000);

describe('temperatures typed once', () => {
  beforeEach(() => window.localStorage.clear());

  it('are there for the next lot of the tract, not for another tract', () => {
    keepTemperatures('millpond', zone, typed, evening);
    expect(readTemperatures('millpond', zone, later(0.5))).toEqual(typed);
    expect(readTemperatures('sorrel', zone, later(0.5))).toEqual(noTemperatures);
  });

  it('lose the air of now after an hour, and all of them at noon', () => {
    keepTemperatures('millpond', zone, typed, evening);
    expect(readTemperatures('millpond', zone, later(14))).toEqual({ ...typed, now: '' });
    expect(readTemperatures('millpond', zone, later(19))).toEqual(noTemperatures);
  });

  it('belong to the evening on the wall clock of the lot', () => {
    expect(eveningOf(evening, zone)).toBe('2026-04-14');
    // 7:10 am of the 15th
    expect(eveningOf(later(14), zone)).toBe('2026-04-14');
    expect(eveningOf(later(19), zone)).toBe('2026-04-15');
  });

  it('are none where something else was typed or kept', () => {
    expect([temperatureOf('700'), temperatureOf('warm'), temperatureOf(''), temperatureOf('41,5')]).toEqual([
      null,
      null,
      null,
      41.5,
    ]);
    keepTemperatures('millpond', zone, { ...typed, window: '700' }, evening);
    expect(readTemperatures('millpond', zone, evening).window).toBe('');
    window.localStorage.setItem('holdwater.temperatures', '{"millpond":{"now":7}}');
    expect(readTemperatures('millpond', zone, evening)).toEqual(noTemperatures);
  });
});
