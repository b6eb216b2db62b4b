import { Temporal } from 'temporal-polyfill';
import type { NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';

/** The part of a rule card that tells a working day: ISO weekdays, and closures of which only the whole-day ones count here. */
export type WorkingDayRule = Pick<NoticeInput, 'workingDays' | 'closures'>;

/** Prepares a rule once for many questions. A working day is one of the rule's weekdays without a whole-day closure. */
export function workingDayTest(rule: WorkingDayRule): (date: Temporal.PlainDate) => boolean {
  const weekdays = new Set(rule.workingDays);
  const closedDates = new Set((rule.closures ?? []).filter((closure) => typeof closure === 'string'));
  return (date) => weekdays.has(date.dayOfWeek) && !closedDates.has(date.toString());
}

/** @throws RangeError when the date does not exist */
export function isWorkingDay(rule: WorkingDayRule, date: string): boolean {
  return workingDayTest(rule)(Temporal.PlainDate.from(date));
}

/** The first working day after a date. */
export function nextWorkingDay(rule: WorkingDayRule, date: string): string {
  return nthWorkingDay(rule, date, 1);
}

/**
 * The working day `count` working days after a date, which need not be a working day itself; 0 is the date itself.
 * @throws RangeError when the date does not exist, the count is no whole number of 0 or more, or the rule has no weekday at all
 */
export function nthWorkingDay(rule: WorkingDayRule, date: string, count: number): string {
  if (!Number.isInteger(count) || count < 0)
    throw new RangeError(`count of working days ${count} is not a whole number`);
  if (!rule.workingDays.some((weekday) => weekday >= 1 && weekday <= 7))
    throw new RangeError('a rule without working days');
  const isWorking = workingDayTest(rule);
  let day = Temporal.PlainDate.from(date);
  for (let left = count; left > 0;) {
    day = day.add({ days: 1 });
    if (isWorking(day)) left -= 1;
  }
  return day.toString();
}

/** How many working days come after `fromDate` up to and with `toDate`; 0 when `toDate` is not later. */
export function workingDaysBetween(rule: WorkingDayRule, fromDate: string, toDate: string): number {
  const isWorking = workingDayTest(rule);
  const last = Temporal.PlainDate.from(toDate);
  let count = 0;
  let day = Temporal.PlainDate.from(fromDate).add({ days: 1 });
  for (; Temporal.PlainDate.compare(day, last) <= 0; day = day.add({ days: 1 })) {
    if (isWorking(day)) count += 1;
  }
  return count;
}
