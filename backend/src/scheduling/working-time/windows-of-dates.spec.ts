import { describe, expect, it } from 'vitest';
import { windowsOfDates } from './windows-of-dates.js';

const morning = { label: 'morning', start: '08:00', end: '12:00' };
const late = { label: 'late', start: '16:00', end: '18:00', days: [1, 5] };

describe('the windows of a span of dates', () => {
  it('lists past and coming days by date, then as given, across the change of clocks (IANA tz: -07:00, then -06:00)', () => {
    const rule = { zone: 'America/Denver', workingDays: [1, 2, 3, 4, 5], windows: [late, morning] };
    expect(windowsOfDates(rule, '2027-03-12', '2027-03-16')).toEqual([
      { date: '2027-03-12', label: 'late', startAt: '2027-03-12T23:00:00.000Z', endAt: '2027-03-13T01:00:00.000Z' },
      { date: '2027-03-12', label: 'morning', startAt: '2027-03-12T15:00:00.000Z', endAt: '2027-03-12T19:00:00.000Z' },
      { date: '2027-03-15', label: 'late', startAt: '2027-03-15T22:00:00.000Z', endAt: '2027-03-16T00:00:00.000Z' },
      { date: '2027-03-15', label: 'morning', startAt: '2027-03-15T14:00:00.000Z', endAt: '2027-03-15T18:00:00.000Z' },
      { date: '2027-03-16', label: 'morning', startAt: '2027-03-16T14:00:00.000Z', endAt: '2027-03-16T18:00:00.000Z' },
    ]);
  });

  it('leaves out whole days and overlapped windows, and keeps the rest of a half-closed day', () => {
    const closures = ['2027-03-15', { date: '2027-03-19', from: '11:00', to: '15:00' }];
    const rule = { zone: 'America/Phoenix', workingDays: [1, 5], closures, windows: [morning, late] };
    const found = windowsOfDates(rule, '2027-03-15', '2027-03-22').map(({ date, label }) => `${date} ${label}`);
    expect(found).toEqual(['2027-03-19 late', '2027-03-22 morning', '2027-03-22 late']);
  });

  it('spans the hour that comes twice: 01:00 to 03:00 on 2027-11-07 in New York lasts three hours (IANA tz)', () => {
    const night = { label: 'night', start: '01:00', end: '03:00' };
    const rule = { zone: 'America/New_York', workingDays: [7], windows: [night] };
    expect(windowsOfDates(rule, '2027-11-07', '2027-11-07')).toEqual([
      { date: '2027-11-07', label: 'night', startAt: '2027-11-07T05:00:00.000Z', endAt: '2027-11-07T08:00:00.000Z' },
    ]);
  });

  it('takes an empty list of days as every working day, and an empty or backward span as nothing', () => {
    const rule = { zone: 'America/Phoenix', workingDays: [1], windows: [{ ...morning, days: [] }] };
    expect(windowsOfDates(rule, '2027-03-15', '2027-03-15')).toHaveLength(1);
    expect(windowsOfDates(rule, '2027-03-15', '2027-03-14')).toEqual([]);
    expect(windowsOfDates({ ...rule, windows: null }, '2027-03-15', '2027-03-15')).toEqual([]);
  });
});
