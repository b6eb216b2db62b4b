import type { VisitState } from '@holdwater/shared-types/visits/visit.states.js';
import { type InstantRange, spanOf } from '../common/time/ranges.js';

/** What of a visit its calendar entry is made of. */
export interface CalendarFacts {
  readonly state: VisitState;
  readonly window: InstantRange;
  readonly hasFirstPlace: boolean;
  readonly calendarSequence: number;
}

type CalendarStatus = 'none' | 'CONFIRMED' | 'CANCELLED';

/**
 * What the entry's STATUS is (RFC 5545 §3.8.1.11). A request nobody placed yet has no entry; one that was not reached had one, taken out
 * again.
 */
export function calendarStatusOf(visit: Pick<CalendarFacts, 'state' | 'hasFirstPlace'>): CalendarStatus {
  if (visit.state === 'requested') return visit.hasFirstPlace ? 'CANCELLED' : 'none';
  const isOver = visit.state === 'declined' || visit.state === 'withdrawn' || visit.state === 'freed';
  return isOver ? 'CANCELLED' : 'CONFIRMED';
}

/**
 * The SEQUENCE after a change: one more when DTSTART, DTEND or STATUS of an entry that was sent changes (RFC 5546 §2.1.4); the first
 * invite keeps 0. An end without an entry before it (a request declined) sends nothing and counts nothing.
 */
export function nextCalendarSequence(before: CalendarFacts, after: Omit<CalendarFacts, 'calendarSequence'>): number {
  const was = calendarStatusOf(before);
  const is = calendarStatusOf(after);
  if (was === 'none') return before.calendarSequence;
  const isChanged = was !== is || (is === 'CONFIRMED' && !isSameSpan(before.window, after.window));
  return before.calendarSequence + (isChanged ? 1 : 0);
}

function isSameSpan(one: InstantRange, other: InstantRange): boolean {
  const [a, b] = [spanOf(one), spanOf(other)];
  return a.startAt.getTime() === b.startAt.getTime() && a.endAt.getTime() === b.endAt.getTime();
}
