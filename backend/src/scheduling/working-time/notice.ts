import type { NoticeAnswer, NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';
import { instantOf, localDateOf } from './local-instant.js';
import { windowsOfDates } from './windows-of-dates.js';
import { isWorkingDay, nextWorkingDay, nthWorkingDay } from './working-days.js';

/**
 * Which windows a request made now may ask for. Up to and including the cut-off on a working day it counts for that day; later, or on
 * a day off, for the next working day. The first open day is `workingDaysAhead` working days after the day it counts for, and
 * `horizonWorkingDays` working days are open, the first included. Windows already begun are listed; offers leave them out.
 * @throws RangeError when a zone, date or instant does not exist, or the rule has no working day
 */
export function computeNotice(input: NoticeInput): NoticeAnswer {
  const countsForDate = dateCountedFor(input);
  const firstDate = nthWorkingDay(input, countsForDate, input.workingDaysAhead);
  const lastDate = nthWorkingDay(input, firstDate, input.horizonWorkingDays - 1);
  return {
    countsForDate,
    firstDate,
    lastDate,
    cutoffAt: instantOf(countsForDate, input.cutoff, input.zone).toISOString(),
    windows: windowsOfDates(input, firstDate, lastDate),
  };
}

function dateCountedFor(input: NoticeInput): string {
  const now = new Date(input.now);
  const today = localDateOf(now, input.zone);
  const isInTime = now.getTime() <= instantOf(today, input.cutoff, input.zone).getTime();
  return isInTime && isWorkingDay(input, today) ? today : nextWorkingDay(input, today);
}
