import type { readCalendar } from '@holdwater/shared-types/visits/calendar.contract.js';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { MarkName } from '../../components/mark-names';
import type { RibbonDay, RibbonMark, RibbonShelf } from '../../drawings/week-ribbon.types';
import { hoursOfDay } from '../../lib/local-days';
import type { ShownSpan } from '../../lib/shown-date';

export type Calendar = RouteAnswer<typeof readCalendar>;
type Lane = Calendar['lanes'][number];
type LaneDay = Lane['days'][number];

/** Drawn when no window says otherwise. */
const usualHours = { from: 7, to: 17 };

/** States that stand on no shelf any more: lists and history tell them. */
const goneStates: readonly VisitSummary['state'][] = ['withdrawn', 'declined', 'freed'];

export interface RibbonContext {
  readonly dates: readonly string[];
  readonly calendar: Calendar | undefined;
  readonly span: ShownSpan | null;
  readonly today: string;
  readonly labelOf: (date: string) => string;
}

/** The ten days as the ribbon draws them: shelves from the rule cards, visits standing on them, one row per department. */
export function ribbonDays(context: RibbonContext): RibbonDay[] {
  return context.dates.map((date) => {
    const visits = (context.calendar?.visits ?? []).filter(
      (visit) => visit.window.date === date && !goneStates.includes(visit.state),
    );
    const laneDays = (context.calendar?.lanes ?? []).map((lane) => ({
      lane,
      day: lane.days.find((one) => one.date === date),
    }));
    const known = laneDays.flatMap(({ lane, day }, row) => (day === undefined ? [] : [{ lane, day, row }]));
    return {
      date,
      label: context.labelOf(date),
      shelves: known.flatMap(({ lane, day, row }) => shelvesOf(lane, day, row)),
      marks: visits.map((visit) => markOf(visit, rowOf(context.calendar, visit))),
      isClosed: known.length > 0 && known.every(({ day }) => isClosed(day)),
      closures: known.flatMap(({ lane, day, row }) => closuresOf(lane, day, row)),
      visits: visits.length,
      notUp: visits.filter((visit) => isNotUp(visit, date, context.today)).length,
      isBracketed: context.span !== null && context.span.from <= date && date <= context.span.to,
      isToday: date === context.today,
    };
  });
}

/** Whole hours that hold every window of the two weeks. */
export function ribbonHours(calendar: Calendar | undefined): { from: number; to: number } {
  const windows = (calendar?.lanes ?? []).flatMap((lane) =>
    lane.days.flatMap((day) =>
      day.windows.map((w) => ({ from: hoursOfDay(w.startAt, lane.zone), to: hoursOfDay(w.endAt, lane.zone) })),
    ),
  );
  if (windows.length === 0) return usualHours;
  const from = Math.floor(Math.min(...windows.map((w) => w.from)));
  const to = Math.ceil(Math.max(...windows.map((w) => w.to)));
  return { from: Math.min(from, usualHours.from), to: Math.max(to, usualHours.to) };
}

/** The mark a visit stands as. */
export function visitMark(visit: Pick<VisitSummary, 'state' | 'outcome' | 'systemsUp'>): MarkName {
  if (visit.state === 'closed') return visit.outcome?.kind ?? 'withdrawn';
  const isPartUp = visit.systemsUp.some((system) => system.isUp);
  return visit.state === 'booked' && isPartUp ? 'part-up' : visit.state;
}

function rowOf(calendar: Calendar | undefined, visit: VisitSummary): number {
  return Math.max(0, calendar?.lanes.findIndex((lane) => lane.departmentId === visit.departmentId) ?? 0);
}

function markOf(visit: VisitSummary, row: number): RibbonMark {
  return { at: hoursOfDay(visit.plannedStartAt ?? visit.window.startAt, visit.zone), mark: visitMark(visit), row };
}

/** Told from today to the day after tomorrow's working day; a booking of next week is not late. */
function isNotUp(visit: VisitSummary, date: string, today: string): boolean {
  if (visit.state !== 'booked' || date < today) return false;
  return visit.upBy !== null && Date.parse(visit.upBy) - Date.now() < 36 * 3_600_000;
}

function shelvesOf(lane: Lane, day: LaneDay, row: number): RibbonShelf[] {
  if (isClosed(day)) return [];
  return day.windows.map((window) => ({
    from: hoursOfDay(window.startAt, lane.zone),
    to: hoursOfDay(window.endAt, lane.zone),
    label: window.label,
    row,
    isShut: !window.isTakeable,
    ...loadOf(lane, window),
  }));
}

/** Only a department sees how full its own windows are. */
function loadOf(lane: Lane, window: LaneDay['windows'][number]): { booked?: number; up?: number } {
  if (!lane.isOwn || window.room === 0) return {};
  const booked = window.room - window.roomLeft;
  return { booked: Math.min(1, booked / window.room), up: booked > 0 && window.up !== null ? window.up / booked : 0 };
}

function isClosed(day: LaneDay): boolean {
  return !day.isWorkingDay || day.closed.some((span) => span.from === null);
}

function closuresOf(lane: Lane, day: LaneDay, row: number): { from: number; to: number; row: number }[] {
  return day.closed.flatMap(({ from, to }) =>
    from === null || to === null ? [] : [{ from: hoursOfDay(from, lane.zone), to: hoursOfDay(to, lane.zone), row }],
  );
}
