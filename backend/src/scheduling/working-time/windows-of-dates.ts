import { Temporal } from 'temporal-polyfill';
import type {
  NoticeInput,
  NoticeWindow,
  NoticeWindowRule,
} from '@holdwater/shared-types/scheduling/notice.contract.js';
import { isClosedDuring, spansByDate, type ClockSpan } from './closed-spans.js';
import { dayClock } from './local-instant.js';
import { workingDayTest } from './working-days.js';

/** The part of a rule card that makes its windows. */
export type WindowRule = Pick<NoticeInput, 'zone' | 'workingDays' | 'closures' | 'windows'>;

/**
 * Every window from one date to another, both included, past or to come, by date and then as the rule card gives them. Days off and
 * whole-day closures have none; a window that overlaps a closed span is left out. Ends are instants in `Z`; on the day clocks go
 * forward a window that begins inside the gap can end before it starts, as the rule for skipped times has it.
 * @throws RangeError when a date or the zone does not exist
 */
export function windowsOfDates(rule: WindowRule, fromDate: string, toDate: string): NoticeWindow[] {
  const isWorking = workingDayTest(rule);
  const closed = spansByDate(rule.closures ?? []);
  const last = Temporal.PlainDate.from(toDate);
  const found: NoticeWindow[] = [];
  let day = Temporal.PlainDate.from(fromDate);
  for (; Temporal.PlainDate.compare(day, last) <= 0; day = day.add({ days: 1 })) {
    if (isWorking(day)) found.push(...windowsOfDay(rule, day, closed.get(day.toString()) ?? []));
  }
  return found;
}

function windowsOfDay(rule: WindowRule, day: Temporal.PlainDate, closed: readonly ClockSpan[]): NoticeWindow[] {
  const open = (rule.windows ?? []).filter((window) => isOn(window, day.dayOfWeek) && !isClosedDuring(window, closed));
  if (open.length === 0) return [];
  const date = day.toString();
  const clock = dayClock(day, rule.zone);
  return open.map(({ label, start, end }) => ({
    date,
    label,
    startAt: clock(start).toISOString(),
    endAt: clock(end).toISOString(),
  }));
}

function isOn(window: NoticeWindowRule, weekday: number): boolean {
  const days = window.days ?? [];
  return days.length === 0 || days.includes(weekday);
}
