import { describe, expect, it } from 'vitest';
import { upByOf } from './up-by.js';

const tested = { systems: ['dwv'] };
const clockTime = (time: string) => ({ upBy: { kind: 'clock-time' as const, time } });
const hoursBefore = (hours: number) => ({ upBy: { kind: 'hours-before' as const, hours } });

// offsets from the IANA time zone database: MST −7, EST −5, PST −8; daylight time begins 2027-03-14 and ends 2027-11-07 at 2 am
describe('when a test must be up', () => {
  it.each([
    ['America/Denver', '2027-03-03', '2027-03-03T14:30:00Z', '2027-03-03T14:00:00.000Z'],
    ['America/New_York', '2027-03-03', '2027-03-03T12:30:00Z', '2027-03-03T12:00:00.000Z'],
    ['America/Los_Angeles', '2027-03-15', '2027-03-15T14:30:00Z', '2027-03-15T14:00:00.000Z'],
  ])('is 7 am of the window’s day in %s', (zone, date, startAt, expected) => {
    expect(upByOf(clockTime('07:00'), tested, { date, startAt: new Date(startAt) }, zone)?.toISOString()).toBe(
      expected,
    );
  });

  it('is real hours before the window, over a change of clocks too', () => {
    // Sunday 2027-03-14 in Denver: 7:30 am daylight time is 13:30 Z; eight hours before it was 10:30 pm of Saturday, standard time
    const window = { date: '2027-03-14', startAt: new Date('2027-03-14T13:30:00Z') };
    expect(upByOf(hoursBefore(8), tested, window, 'America/Denver')?.toISOString()).toBe('2027-03-14T05:30:00.000Z');
    expect(upByOf(hoursBefore(0.5), tested, window, 'America/Denver')?.toISOString()).toBe('2027-03-14T13:00:00.000Z');
  });

  it('is never after the window has started', () => {
    const window = { date: '2027-03-03', startAt: new Date('2027-03-03T14:30:00Z') };
    expect(upByOf(clockTime('15:00'), tested, window, 'America/Denver')).toEqual(window.startAt);
    expect(upByOf(hoursBefore(0), tested, window, 'America/Denver')).toEqual(window.startAt);
  });

  it('is never for a stage that asks for no test', () => {
    const window = { date: '2027-03-03', startAt: new Date('2027-03-03T14:30:00Z') };
    expect(upByOf(hoursBefore(1), { systems: [] }, window, 'America/Denver')).toBeNull();
  });
});
