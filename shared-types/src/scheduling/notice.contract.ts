import { z } from 'zod';
import { clockTime, instant, localDate, zone } from '../common/fields.js';

/** The most working days a request may be made ahead, or a calendar stay open. */
export const maxWorkingDays = 260;
export const maxWindows = 20;

/** ISO 8601: 1 is Monday, 7 is Sunday. */
export const isoWeekday = z.int().min(1, 'not-a-weekday').max(7, 'not-a-weekday');

/** Clock times sort as text, so text compares. Equal ends are allowed. */
const endsBeforeStart = 'ends-before-it-starts';

/** A whole day (its date alone), or a span of one day by the wall clock: closed from `from`, open again at `to`. */
export const closure = z.union(
  [
    localDate,
    z
      .strictObject({ date: localDate, from: clockTime, to: clockTime })
      .refine(({ from, to }) => from <= to, { message: endsBeforeStart, path: ['to'] }),
  ],
  'not-a-closure',
);
export type Closure = z.infer<typeof closure>;

/** A window as the rule card has it. Without `days` (absent, null or empty) it is on every working day. */
export const noticeWindowRule = z
  .strictObject({
    label: z.string().min(1, 'required').max(200, 'too-long'),
    start: clockTime,
    end: clockTime,
    days: z.array(isoWeekday).max(7, 'too-many').nullish(),
  })
  .refine(({ start, end }) => start <= end, { message: endsBeforeStart, path: ['end'] });
export type NoticeWindowRule = z.infer<typeof noticeWindowRule>;

/** Years in which every answer is still a four-digit date, whatever the zone and the horizon. */
const isNearEnough = (now: string) => {
  const year = new Date(now).getUTCFullYear();
  return year >= 1 && year <= 9000;
};

/** What `POST /api/calc/notice` takes. Null means absent; `now` carries `Z` or an offset. */
export const noticeInput = z
  .strictObject({
    zone,
    now: instant.refine(isNearEnough, 'out-of-range'),
    workingDays: z.array(isoWeekday).min(1, 'required').max(7, 'too-many'),
    closures: z.array(closure).nullish(),
    cutoff: clockTime,
    workingDaysAhead: z.int().min(0, 'out-of-range').max(maxWorkingDays, 'too-many'),
    horizonWorkingDays: z.int().min(1, 'out-of-range').max(maxWorkingDays, 'too-many'),
    windows: z.array(noticeWindowRule).max(maxWindows, 'too-many').nullish(),
  })
  .meta({ id: 'NoticeInput' });
export type NoticeInput = z.infer<typeof noticeInput>;

/** One window of one day, its ends as instants in `Z`. */
export const noticeWindow = z
  .object({ date: localDate, label: z.string(), startAt: instant, endAt: instant })
  .meta({ id: 'NoticeWindow' });
export type NoticeWindow = z.infer<typeof noticeWindow>;

/** The day a request made now counts for, the days open to it, and their windows by date, then as given. */
export const noticeAnswer = z
  .object({
    countsForDate: localDate,
    firstDate: localDate,
    lastDate: localDate,
    cutoffAt: instant,
    windows: z.array(noticeWindow),
  })
  .meta({ id: 'NoticeAnswer' });
export type NoticeAnswer = z.infer<typeof noticeAnswer>;
