import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  isWorkingDay,
  nextWorkingDay,
  nthWorkingDay,
  workingDaysBetween,
  type WorkingDayRule,
} from './working-days.js';

/** Weekdays of March 2027: the 1st is a Monday (ISO 8601 calendar; `cal 3 2027` agrees). */
const rule: WorkingDayRule = {
  workingDays: [1, 2, 3, 4, 5],
  closures: ['2027-03-15', { date: '2027-03-19', from: '11:00', to: '17:00' }],
};

describe('working days', () => {
  it('are the weekdays of the rule without the whole-day closures', () => {
    expect(isWorkingDay(rule, '2027-03-12')).toBe(true);
    expect(isWorkingDay(rule, '2027-03-13')).toBe(false);
    expect(isWorkingDay(rule, '2027-03-14')).toBe(false);
    expect(isWorkingDay(rule, '2027-03-15')).toBe(false);
    expect(isWorkingDay(rule, '2027-03-19')).toBe(true);
    expect(isWorkingDay({ workingDays: [7] }, '2027-03-14')).toBe(true);
  });

  it('are counted from the day after', () => {
    expect(nextWorkingDay(rule, '2027-03-12')).toBe('2027-03-16');
    expect(nthWorkingDay(rule, '2027-03-13', 0)).toBe('2027-03-13');
    expect(nthWorkingDay(rule, '2027-03-12', 4)).toBe('2027-03-19');
    expect(nthWorkingDay(rule, '2027-03-12', 5)).toBe('2027-03-22');
    expect(workingDaysBetween(rule, '2027-03-12', '2027-03-22')).toBe(5);
    expect(workingDaysBetween(rule, '2027-03-22', '2027-03-12')).toBe(0);
  });

  it('has 261 weekdays in 2027: 365 days of which 104 are Saturdays and Sundays (ISO 8601 calendar)', () => {
    expect(workingDaysBetween({ workingDays: [1, 2, 3, 4, 5] }, '2026-12-31', '2027-12-31')).toBe(261);
  });

  it('refuses what would never end, and dates that do not exist', () => {
    expect(() => nextWorkingDay({ workingDays: [] }, '2027-03-12')).toThrow(RangeError);
    expect(() => nthWorkingDay(rule, '2027-03-12', 1.5)).toThrow(RangeError);
    expect(() => isWorkingDay(rule, '2027-02-29')).toThrow(RangeError);
  });

  it('the nth working day is a working day with n of them after the start', () => {
    const weekdays = fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1 });
    const march = fc.integer({ min: 10, max: 31 }).map((day) => `2027-03-${day}`);
    fc.assert(
      fc.property(
        weekdays,
        fc.array(march),
        march,
        fc.integer({ min: 1, max: 30 }),
        (workingDays, closures, from, count) => {
          const nth = nthWorkingDay({ workingDays, closures }, from, count);
          expect(isWorkingDay({ workingDays, closures }, nth)).toBe(true);
          expect(workingDaysBetween({ workingDays, closures }, from, nth)).toBe(count);
        },
      ),
    );
  });
});
