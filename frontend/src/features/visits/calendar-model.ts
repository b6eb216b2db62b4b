import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Calendar } from '../../app/layout/ribbon-days';
import { addDays, daysBetween, hoursOfDay, localDateOf, weekdayOf, workWeekOf } from '../../lib/local-days';
import { isGone } from './visit-look';

export type Lane = Calendar['lanes'][number];
export type LaneDay = Lane['days'][number];
export type LaneWindow = LaneDay['windows'][number];

/** One department on one day. */
export interface LaneCell {
  readonly lane: Lane;
  readonly day: LaneDay | null;
  /** In order of time; those that stand on no board any more are left to the list. */
  readonly visits: readonly VisitSummary[];
}

export interface CalendarDay {
  readonly date: string;
  readonly cells: readonly LaneCell[];
}

const usualHours = { from: 7, to: 17 };

/** When a visit comes: planned, or at the start of its window until it is. */
export function startOf(visit: Pick<VisitSummary, 'plannedStartAt' | 'window'>): string {
  return visit.plannedStartAt ?? visit.window.startAt;
}

export function byTime(a: VisitSummary, b: VisitSummary): number {
  return (
    Date.parse(startOf(a)) - Date.parse(startOf(b)) || a.lotNumber.localeCompare(b.lotNumber, 'en', { numeric: true })
  );
}

/** The working days of some weeks from the week of `date`; a Saturday or Sunday only where somebody works or comes. */
export function shownDates(date: string, weeks: number, calendar: Calendar | undefined): string[] {
  const monday = workWeekOf(date)[0] ?? date;
  const all = Array.from({ length: weeks * 7 }, (_, day) => addDays(monday, day));
  return all.filter((one) => weekdayOf(one) <= 5 || isWorked(one, calendar));
}

function isWorked(date: string, calendar: Calendar | undefined): boolean {
  const hasWindows = calendar?.lanes.some((lane) =>
    lane.days.some((day) => day.date === date && day.windows.length > 0),
  );
  return hasWindows === true || (calendar?.visits ?? []).some((visit) => visit.window.date === date && !isGone(visit));
}

/** The days of a calendar, department by department. */
export function calendarDays(calendar: Calendar, dates: readonly string[], tract: string | null): CalendarDay[] {
  const shown = calendar.visits.filter((visit) => !isGone(visit) && (tract === null || visit.tractName === tract));
  return dates.map((date) => ({
    date,
    cells: calendar.lanes.map((lane) => ({
      lane,
      day: lane.days.find((one) => one.date === date) ?? null,
      visits: shown
        .filter((visit) => visit.departmentId === lane.departmentId && visit.window.date === date)
        .sort(byTime),
    })),
  }));
}

/** Hours since midnight of `date` on the wall clock of `zone`: an instant of another day is below 0 or above 24. */
export function hoursOn(date: string, instant: string, zone: string): number {
  return hoursOfDay(instant, zone) + 24 * daysBetween(date, localDateOf(instant, zone));
}

/** Whole hours that hold every window and visit shown, in the page's zone. */
export function shownHours(days: readonly CalendarDay[], zone: string): { from: number; to: number } {
  const spans = days.flatMap(({ date, cells }) =>
    cells.flatMap(({ day, visits }) => [
      ...(day?.windows ?? []).map((one) => [hoursOn(date, one.startAt, zone), hoursOn(date, one.endAt, zone)] as const),
      ...visits.map((visit) => {
        const from = hoursOn(date, startOf(visit), zone);
        return [from, visit.plannedEndAt === null ? from : hoursOn(date, visit.plannedEndAt, zone)] as const;
      }),
    ]),
  );
  const from = Math.min(usualHours.from, ...spans.map(([start]) => Math.floor(start)));
  const to = Math.max(usualHours.to, ...spans.map(([, end]) => Math.ceil(end)));
  return { from: Math.max(0, from), to: Math.min(24, to) };
}

/** What a window says of itself to the reader. */
export function windowSays(window: LaneWindow, nowMs: number): 'over' | 'full' | 'shut' | 'room' {
  if (Date.parse(window.startAt) <= nowMs) return 'over';
  if (window.roomLeft === 0) return 'full';
  return window.isTakeable ? 'room' : 'shut';
}

/** The tracts of the visits shown, by name. */
export function tractsOf(calendar: Calendar): string[] {
  const names = calendar.visits.flatMap(({ tractName }) => (tractName === null ? [] : [tractName]));
  return [...new Set(names)].sort((a, b) => a.localeCompare(b));
}

/** Names without the words that all of them end in: "Tallowmere" and "Vennick" of two building departments. */
export function shortNames(names: readonly string[]): string[] {
  if (names.length < 2) return [...names];
  const split = names.map((name) => name.split(' '));
  let shared = 0;
  while (split.every((words) => words.length > shared + 1 && words.at(-1 - shared) === split[0]?.at(-1 - shared))) {
    shared += 1;
  }
  return split.map((words) => words.slice(0, words.length - shared).join(' '));
}
