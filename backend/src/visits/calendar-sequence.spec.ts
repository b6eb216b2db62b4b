import { type VisitState, visitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { describe, expect, it } from 'vitest';
import type { InstantRange } from '../common/time/ranges.js';
import { calendarStatusOf, nextCalendarSequence } from './calendar-sequence.js';

const early: InstantRange = [new Date('2027-03-03T14:30:00Z'), new Date('2027-03-03T16:00:00Z')];
const late: InstantRange = [new Date('2027-03-03T20:30:00Z'), new Date('2027-03-03T22:30:00Z')];
const visit = (state: VisitState, window = early, hasFirstPlace = false) => ({
  state,
  window,
  hasFirstPlace,
  calendarSequence: 4,
});
const step = (before: ReturnType<typeof visit>, after: ReturnType<typeof visit>) =>
  nextCalendarSequence(before, after) - 4;

// RFC 5546 §2.1.4: SEQUENCE is raised when DTSTART, DTEND or STATUS (among others) changes; it starts at 0 and never goes back
describe('the SEQUENCE of a calendar entry', () => {
  it('stays at its start for the first invite, whatever window the request wished for', () => {
    expect(step(visit('requested'), visit('requested', late))).toBe(0);
    expect(step(visit('requested'), visit('booked', late))).toBe(0);
  });

  it('counts a move of an entry that was sent, and no other change', () => {
    expect(step(visit('booked'), visit('booked', late))).toBe(1);
    expect(step(visit('ready'), visit('ready', late))).toBe(1);
    expect(step(visit('booked'), visit('booked'))).toBe(0);
    expect(step(visit('booked'), visit('ready'))).toBe(0);
    expect(step(visit('ready'), visit('underway'))).toBe(0);
    expect(step(visit('underway'), visit('closed'))).toBe(0);
  });

  it.each(['withdrawn', 'freed'] as const)('counts a cancellation: booked to %s', (state) => {
    expect(step(visit('booked'), visit(state))).toBe(1);
  });

  it('counts a cancellation and the new invite of a visit that was not reached', () => {
    expect(step(visit('underway'), visit('requested', early, true))).toBe(1);
    expect(step(visit('requested', early, true), visit('requested', late, true))).toBe(0);
    expect(step(visit('requested', early, true), visit('booked', late, true))).toBe(1);
    expect(step(visit('requested', early, true), visit('declined', early, true))).toBe(0);
  });

  it('counts nothing for a request that ends before anything was sent', () => {
    expect(step(visit('requested'), visit('declined'))).toBe(0);
    expect(step(visit('requested'), visit('withdrawn'))).toBe(0);
  });

  it('never goes back, from any state to any other', () => {
    for (const from of visitStates) {
      for (const to of visitStates) expect(step(visit(from), visit(to, late))).toBeGreaterThanOrEqual(0);
    }
  });

  it('is of an entry that is confirmed, cancelled or not there (RFC 5545 §3.8.1.11)', () => {
    expect(calendarStatusOf({ state: 'requested', hasFirstPlace: false })).toBe('none');
    expect(calendarStatusOf({ state: 'closed', hasFirstPlace: false })).toBe('CONFIRMED');
    expect(calendarStatusOf({ state: 'withdrawn', hasFirstPlace: false })).toBe('CANCELLED');
  });
});
