import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cutoffForDates, type CutoffRule } from './cutoff-for-dates.js';
import { computeNotice } from './notice.js';

/** The example of the calculations: working days Monday to Friday, asked for by 15:00 the working day before, Monday the 15th closed. */
const example: CutoffRule = {
  zone: 'America/Denver',
  workingDays: [1, 2, 3, 4, 5],
  closures: ['2027-03-15'],
  cutoff: '15:00',
  workingDaysAhead: 1,
};
const cutoffOf = (date: string, change: Partial<CutoffRule> = {}) =>
  cutoffForDates({ ...example, ...change }, [date])
    .get(date)
    ?.toISOString();

describe('until when a date can be asked for', () => {
  it.each([
    // dates counted on a printed calendar of 2027, offsets from IANA tz: daylight time begins 2027-03-14
    ['2027-03-12', '2027-03-11T22:00:00.000Z'],
    ['2027-03-16', '2027-03-12T22:00:00.000Z'],
    ['2027-03-17', '2027-03-16T21:00:00.000Z'],
    // a day off itself stands for the working day before it
    ['2027-03-14', '2027-03-11T22:00:00.000Z'],
  ])('%s: %s', (date, cutoff) => {
    expect(cutoffOf(date)).toBe(cutoff);
  });

  it('is the day itself with no day ahead, and steps over days off with several', () => {
    expect(cutoffOf('2027-03-17', { workingDaysAhead: 0 })).toBe('2027-03-17T21:00:00.000Z');
    expect(cutoffOf('2027-03-17', { workingDaysAhead: 3 })).toBe('2027-03-11T22:00:00.000Z');
  });

  it('is not told of a rule without working days', () => {
    expect(() => cutoffOf('2027-03-17', { workingDays: [] })).toThrow(RangeError);
  });

  it('is the very moment after which the date is open no more, by the notice itself', () => {
    const days = fc.integer({ min: 0, max: 60 });
    const dateOf = (day: number) => new Date(Date.UTC(2027, 1, 20 + day)).toISOString().slice(0, 10);
    const rules = fc.record({
      zone: fc.constantFrom('America/New_York', 'America/Denver', 'America/Phoenix'),
      workingDays: fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1 }),
      closures: fc.array(days.map(dateOf), { maxLength: 20 }),
      cutoff: fc.constantFrom('00:00', '09:30', '15:00', '23:59'),
      workingDaysAhead: fc.integer({ min: 0, max: 5 }),
    });
    fc.assert(
      fc.property(rules, days.map(dateOf), (rule, date) => {
        const cutoff = cutoffForDates(rule, [date]).get(date) as Date;
        const firstDateAt = (ms: number) =>
          computeNotice({ ...rule, horizonWorkingDays: 1, windows: [], now: new Date(ms).toISOString() }).firstDate;
        expect(firstDateAt(cutoff.getTime()) <= date).toBe(true);
        expect(firstDateAt(cutoff.getTime() + 1) > date).toBe(true);
      }),
    );
  });
});
