import type { NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';
import { Temporal } from 'temporal-polyfill';
import { instantOf } from './local-instant.js';
import { workingDayTest } from './working-days.js';

export type CutoffRule = Pick<NoticeInput, 'zone' | 'workingDays' | 'closures' | 'cutoff' | 'workingDaysAhead'>;

/**
 * The last instant at which a request still opens each of these dates: the cut-off of the working day that lies `workingDaysAhead` working
 * days before the date, or before the last working day up to it. The other way round of `computeNotice`.
 * @throws RangeError when a zone or date does not exist, or the rule has no working day
 */
export function cutoffForDates(rule: CutoffRule, dates: readonly string[]): Map<string, Date> {
  if (!rule.workingDays.some((weekday) => weekday >= 1 && weekday <= 7))
    throw new RangeError('a rule without working days');
  const isWorking = workingDayTest(rule);
  return new Map(dates.map((date) => [date, instantOf(dayBefore(rule, isWorking, date), rule.cutoff, rule.zone)]));
}

function dayBefore(rule: CutoffRule, isWorking: (day: Temporal.PlainDate) => boolean, date: string): string {
  let day = Temporal.PlainDate.from(date);
  for (let left = rule.workingDaysAhead; ; day = day.subtract({ days: 1 })) {
    if (!isWorking(day)) continue;
    if (left === 0) return day.toString();
    left -= 1;
  }
}
