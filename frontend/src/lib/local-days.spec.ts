import { describe, expect, it } from 'vitest';
import {
  addDays,
  daysBetween,
  hoursOfDay,
  instantOf,
  localDateOf,
  mondayOf,
  nextWeekdayAfter,
  twoWorkWeeksOf,
  weekdayOf,
  workingMondayOf,
} from './local-days';

// Weekdays and leap days from any printed calendar; changes of clocks by 15 U.S.C. 260a.
describe('days', () => {
  it('run over months, leap days and changes of clocks', () => {
    expect(addDays('2028-02-28', 1)).toBe('2028-02-29');
    expect(addDays('2026-03-07', 1)).toBe('2026-03-08');
    expect(daysBetween('2026-03-01', '2026-04-01')).toBe(31);
    expect(daysBetween('2026-04-01', '2026-03-01')).toBe(-31);
  });

  it('know their week', () => {
    expect(weekdayOf('2026-04-15')).toBe(3);
    expect(mondayOf('2026-04-19')).toBe('2026-04-13');
    expect(workingMondayOf('2026-04-19')).toBe('2026-04-20');
    expect(workingMondayOf('2026-04-17')).toBe('2026-04-13');
    expect(nextWeekdayAfter('2026-04-17')).toBe('2026-04-20');
    const weeks = twoWorkWeeksOf('2026-04-15');
    expect(weeks).toHaveLength(10);
    expect([weeks[0], weeks[4], weeks[5], weeks[9]]).toEqual(['2026-04-13', '2026-04-17', '2026-04-20', '2026-04-24']);
  });
});

describe('instants and wall clocks', () => {
  it('turn into each other in a zone', () => {
    expect(localDateOf('2026-04-15T05:30:00Z', 'America/Denver')).toBe('2026-04-14');
    expect(hoursOfDay('2026-04-15T15:30:00Z', 'America/Denver')).toBe(9.5);
    expect(instantOf('2026-04-15', '07:00', 'America/Denver')).toBe('2026-04-15T13:00:00Z');
  });

  it('take the first of two equal times and the later side of a gap (RFC 5545, 3.3.5)', () => {
    expect(instantOf('2026-11-01', '01:30', 'America/Denver')).toBe('2026-11-01T07:30:00Z');
    expect(instantOf('2026-03-08', '02:30', 'America/Denver')).toBe('2026-03-08T09:30:00Z');
  });
});
