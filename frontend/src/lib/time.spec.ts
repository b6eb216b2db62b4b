import { describe, expect, it } from 'vitest';
import {
  clockWords,
  dateRangeWords,
  dateWords,
  dateYearWords,
  dayClockWords,
  dayWindowWords,
  dayWords,
  durationWords,
  nearDayWords,
  windowWords,
  zoneWords,
} from './time';

// English as interface.md, section 9, writes it; Spanish as the Unicode CLDR writes es-US.
const denver = 'America/Denver';
const wednesdayNine = '2026-04-15T15:00:00Z';
const wednesdayEleven = '2026-04-15T17:00:00Z';
const wednesdayOne = '2026-04-15T19:00:00Z';

describe('days', () => {
  it('are written as the reader writes them, with the year only where asked', () => {
    expect(dateWords('2026-04-15', 'en')).toBe('Wed, Apr 15');
    expect(dateWords('2026-04-15', 'es')).toBe('mié, 15 de abr');
    expect(dateYearWords('2026-04-15', 'en')).toBe('Wed, Apr 15, 2026');
  });

  it('are those of the zone, not of this device', () => {
    const lateTuesday = '2026-04-15T05:30:00Z';
    expect(dayWords(lateTuesday, denver, 'en')).toBe('Tue, Apr 14');
    expect(dayWords(lateTuesday, 'America/New_York', 'en')).toBe('Wed, Apr 15');
  });

  it('near today have words', () => {
    expect(nearDayWords('2026-04-15', '2026-04-14', 'en')).toBe('tomorrow');
    expect(nearDayWords('2026-04-15', '2026-04-14', 'es')).toBe('mañana');
    expect(nearDayWords('2026-04-14', '2026-04-14', 'es')).toBe('hoy');
    expect(nearDayWords('2026-04-16', '2026-04-14', 'en')).toBeNull();
  });

  it('make ranges with an en dash and no spaces', () => {
    expect(dateRangeWords('2026-04-13', '2026-04-17', 'en', true)).toBe('Apr 13–17, 2026');
    expect(dateRangeWords('2026-04-27', '2026-05-08', 'en')).toBe('Apr 27–May 8');
  });
});

describe('clock times', () => {
  it('carry a small am or pm, after a plain space', () => {
    expect(clockWords(wednesdayNine, denver, 'en')).toBe('9:00 am');
    expect(clockWords(wednesdayOne, denver, 'en')).toBe('1:00 pm');
    expect(clockWords(wednesdayNine, denver, 'es')).toBe('9:00 a.m.');
  });

  it('of a window say am or pm once where it is the same', () => {
    expect(windowWords(wednesdayNine, wednesdayEleven, denver, 'en')).toBe('9:00–11:00 am');
    expect(windowWords(wednesdayEleven, wednesdayOne, denver, 'en')).toBe('11:00 am–1:00 pm');
    expect(windowWords(wednesdayNine, wednesdayEleven, denver, 'es')).toBe('9:00–11:00 a.m.');
    expect(dayWindowWords(wednesdayNine, wednesdayEleven, denver, 'en')).toBe('Wed, Apr 15, 9:00–11:00 am');
  });

  it('follow the zone over a change of clocks', () => {
    // 15 U.S.C. 260a: daylight time from the second Sunday of March at 2:00, in 2026 March 8; Mountain 7 h behind before, 6 h after.
    expect(dayClockWords('2026-03-08T08:59:00Z', denver, 'en')).toBe('Sun, Mar 8, 1:59 am');
    expect(dayClockWords('2026-03-08T09:00:00Z', denver, 'en')).toBe('Sun, Mar 8, 3:00 am');
    // Arizona keeps standard time the whole year (A.R.S. 1-242).
    expect(clockWords('2026-03-08T09:00:00Z', 'America/Phoenix', 'en')).toBe('2:00 am');
  });
});

describe('zones', () => {
  it('are named in words', () => {
    expect(zoneWords(denver, 'en')).toBe('Mountain Time');
    expect(zoneWords('America/Los_Angeles', 'en')).toBe('Pacific Time');
    expect(zoneWords('America/Los_Angeles', 'es')).toBe('Hora del Pacífico');
  });
});

describe('durations', () => {
  it.each([
    [72, '1 h 12 min'],
    [45, '45 min'],
    [120, '2 h'],
    [0, '0 min'],
    [-5, '0 min'],
    [59.9, '59 min'],
    [1440 + 180 + 5, '1 day 3 h'],
  ])('%d minutes are %s', (minutes, words) => expect(durationWords(minutes, 'en')).toBe(words));

  it('of days are counted in Spanish', () => expect(durationWords(2 * 1440, 'es')).toBe('2 días'));
});
