import fc from 'fast-check';
import { Temporal } from 'temporal-polyfill';
import { describe, expect, it } from 'vitest';
import { dayClock, instantOf, isZone, localDateOf } from './local-instant.js';

const eastern = 'America/New_York';
const central = 'America/Chicago';
const mountain = 'America/Denver';
const pacific = 'America/Los_Angeles';
const arizona = 'America/Phoenix';
const zones = [
  eastern,
  central,
  mountain,
  pacific,
  arizona,
  'America/Anchorage',
  'Pacific/Honolulu',
  'America/Puerto_Rico',
];
const at = (date: string, time: string, zone: string) => instantOf(date, time, zone).toISOString();

describe('instants of clock times (published: IANA tz database, the US rule of 2007)', () => {
  it.each([
    [eastern, '13'],
    [central, '14'],
    [mountain, '15'],
    [pacific, '16'],
    [arizona, '16'],
    ['America/Anchorage', '17'],
  ])('2026-07-15 09:00 in %s is %s:00Z', (zone, hour) => {
    expect(at('2026-07-15', '09:00', zone)).toBe(`2026-07-15T${hour}:00:00.000Z`);
  });

  it.each([
    ['2027-03-14', eastern, 7],
    ['2027-03-14', central, 8],
    ['2027-03-14', mountain, 9],
    ['2027-03-14', pacific, 10],
    ['2028-03-12', eastern, 7],
    ['2028-03-12', pacific, 10],
  ])('clocks go forward on %s in %s at %i:00Z', (date, zone, utcHour) => {
    const change = Date.parse(`${date}T${String(utcHour).padStart(2, '0')}:00:00Z`);
    expect(instantOf(date, '01:59', zone).getTime()).toBe(change - 60_000);
    expect(instantOf(date, '03:00', zone).getTime()).toBe(change);
  });

  it.each([
    [eastern, 6],
    [central, 7],
    [mountain, 8],
    [pacific, 9],
  ])('clocks go back on 2027-11-07 in %s at %i:00Z', (zone, utcHour) => {
    const change = Date.parse(`2027-11-07T0${utcHour}:00:00Z`);
    expect(instantOf('2027-11-07', '01:59', zone).getTime()).toBe(change - 60_000);
    expect(instantOf('2027-11-07', '02:00', zone).getTime()).toBe(change + 3_600_000);
  });

  it('takes the offset before the gap for a skipped time, the first of a repeated one (RFC 5545 §3.3.5)', () => {
    expect(at('2027-03-14', '02:30', eastern)).toBe('2027-03-14T07:30:00.000Z');
    expect(at('2027-11-07', '01:30', eastern)).toBe('2027-11-07T05:30:00.000Z');
  });

  it.each([
    [arizona, 7],
    ['Pacific/Honolulu', 10],
    ['America/Puerto_Rico', 4],
  ])('%s never changes clocks: %i hours behind all through 2027', (zone, hours) => {
    for (let date = Temporal.PlainDate.from('2027-01-01'); date.year === 2027; date = date.add({ days: 1 })) {
      const utc = Date.parse(`${date.toString()}T02:30:00Z`) + hours * 3_600_000;
      expect(instantOf(date.toString(), '02:30', zone).getTime()).toBe(utc);
    }
  });

  it('refuses dates, times and zones that do not exist', () => {
    expect(() => instantOf('2027-02-29', '09:00', eastern)).toThrow(RangeError);
    expect(() => instantOf('2027-03-01', '25:00', eastern)).toThrow(RangeError);
    expect(() => instantOf('2027-03-01', '09:00', 'America/Nowhere')).toThrow(RangeError);
  });
});

describe('the day it is in a zone', () => {
  it('turns at local midnight, before and after a change of clocks (IANA tz)', () => {
    expect(localDateOf(new Date('2027-03-14T06:59:59.999Z'), mountain)).toBe('2027-03-13');
    expect(localDateOf(new Date('2027-03-14T07:00:00Z'), mountain)).toBe('2027-03-14');
    expect(localDateOf(new Date('2027-03-15T05:59:59.999Z'), mountain)).toBe('2027-03-14');
    expect(localDateOf(new Date('2027-03-15T06:00:00Z'), mountain)).toBe('2027-03-15');
    expect(localDateOf(new Date('2027-03-15T06:00:00Z'), arizona)).toBe('2027-03-14');
  });
});

describe('names of zones', () => {
  it('knows those of the tz database and no others', () => {
    for (const zone of zones) expect(isZone(zone)).toBe(true);
    for (const name of ['America/Nowhere', '', 'Mountain', 'PST8', '../etc']) expect(isZone(name)).toBe(false);
  });
});

/** How a wall clock reads in a zone by ICU's formatter: a reader apart from Temporal's arithmetic. */
function wallClock(instant: Date, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'short' });
  return parts.format(instant);
}

const someDate = fc
  .integer({ min: 0, max: 365 * 12 })
  .map((days) => Temporal.PlainDate.from('2020-01-01').add({ days }));
const changeDates = ['2027-03-14', '2027-11-07', '2028-03-12'].map((date) => Temporal.PlainDate.from(date));
const anyDate = fc.oneof(someDate, fc.constantFrom(...changeDates));
const anyTime = fc
  .integer({ min: 0, max: 1439 })
  .map((minutes) => `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`);
const otherZones = [
  'Australia/Lord_Howe',
  'America/Havana',
  'Asia/Kathmandu',
  'Pacific/Apia',
  'America/Santiago',
  'Africa/Cairo',
];

describe('any date, time and zone', () => {
  it('reads back on the wall clock as it was asked, an hour later only where it was skipped (ICU formatter)', () => {
    fc.assert(
      fc.property(anyDate, anyTime, fc.constantFrom(...zones), (date, time, zone) => {
        const read = wallClock(instantOf(date.toString(), time, zone), zone);
        const isSkipped = wallClock(
          new Date(instantOf(date.toString(), '01:59', zone).getTime() + 60_000),
          zone,
        ).endsWith('03:00');
        const asked = isSkipped && time.startsWith('02:') ? time.replace('02:', '03:') : time;
        expect(read).toBe(`${date.toString()} ${asked}`);
      }),
    );
  });

  it('is never the second of two equal local times: an hour before reads otherwise (ICU formatter)', () => {
    fc.assert(
      fc.property(fc.constantFrom(...changeDates), anyTime, fc.constantFrom(...zones), (date, time, zone) => {
        const instant = instantOf(date.toString(), time, zone);
        const hourBefore = new Date(instant.getTime() - 3_600_000);
        expect(wallClock(hourBefore, zone)).not.toBe(wallClock(instant, zone));
      }),
    );
  });

  it('reads the same through the day clock, in zones with odd changes too', () => {
    fc.assert(
      fc.property(anyDate, anyTime, fc.constantFrom(...zones, ...otherZones), (date, time, zone) => {
        expect(dayClock(date, zone)(time)).toEqual(instantOf(date.toString(), time, zone));
      }),
      { numRuns: 1000 },
    );
  });
});
