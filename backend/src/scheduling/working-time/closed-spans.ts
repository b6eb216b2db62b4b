import { Temporal } from 'temporal-polyfill';
import type { Closure, NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';
import { dayClock, startOfDay } from './local-instant.js';

/** A wall clock's span of one day, half-open. */
export interface ClockSpan {
  readonly from: string;
  readonly to: string;
}

/** A closure on one day; a whole day has no clock times. `startAt` and `endAt` are instants in `Z`. */
export interface ClosedSpan {
  readonly from: string | null;
  readonly to: string | null;
  readonly startAt: string;
  readonly endAt: string;
}

/**
 * What is closed on a date, as given: whole days and spans, on working days and others. An empty span closes nothing.
 * @throws RangeError when the date or the zone does not exist
 */
export function closedSpansOf(rule: Pick<NoticeInput, 'zone' | 'closures'>, date: string): ClosedSpan[] {
  const day = Temporal.PlainDate.from(date);
  const clock = dayClock(day, rule.zone);
  const spans: ClosedSpan[] = [];
  for (const closure of rule.closures ?? []) {
    if (closure === date) {
      const endAt = startOfDay(day.add({ days: 1 }), rule.zone).toISOString();
      spans.push({ from: null, to: null, startAt: startOfDay(day, rule.zone).toISOString(), endAt });
    } else if (typeof closure !== 'string' && closure.date === date && closure.from < closure.to) {
      const { from, to } = closure;
      spans.push({ from, to, startAt: clock(from).toISOString(), endAt: clock(to).toISOString() });
    }
  }
  return spans;
}

/** The closures of part of a day, by date. */
export function spansByDate(closures: readonly Closure[]): Map<string, ClockSpan[]> {
  const byDate = new Map<string, ClockSpan[]>();
  for (const closure of closures) {
    if (typeof closure === 'string' || closure.from >= closure.to) continue;
    const spans = byDate.get(closure.date);
    if (spans) spans.push(closure);
    else byDate.set(closure.date, [closure]);
  }
  return byDate;
}

/** Whether a window shares any time with a closed span, both half-open; a window of no length is the moment it stands at. */
export function isClosedDuring(window: { start: string; end: string }, spans: readonly ClockSpan[]): boolean {
  return spans.some(({ from, to }) =>
    window.start === window.end ? from <= window.start && window.start < to : window.start < to && from < window.end,
  );
}
