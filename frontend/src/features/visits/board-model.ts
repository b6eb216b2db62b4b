import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { DayBoard } from './api/day-board';
import { byTime, hoursOn } from './calendar-model';

export interface BoardHours {
  readonly from: number;
  readonly to: number;
}

/** Share of the board's width, 0 to 1, at an hour. */
export function shareOf(hour: number, { from, to }: BoardHours): number {
  return Math.min(1, Math.max(0, (hour - from) / (to - from)));
}

/** Whole hours that hold every window and planned visit of the day. */
export function boardHours(board: DayBoard): BoardHours {
  const { date, zone } = board;
  const visits = board.inspectors.flatMap((inspector) => inspector.visits);
  const starts = [...board.day.windows.map(({ startAt }) => startAt), ...visits.flatMap(startsOf)];
  const ends = [...board.day.windows.map(({ endAt }) => endAt), ...visits.flatMap(endsOf)];
  return {
    from: Math.max(0, Math.min(8, ...starts.map((at) => Math.floor(hoursOn(date, at, zone))))),
    to: Math.min(24, Math.max(16, ...ends.map((at) => Math.ceil(hoursOn(date, at, zone))))),
  };
}

function startsOf({ plannedStartAt }: VisitSummary): string[] {
  return plannedStartAt === null ? [] : [plannedStartAt];
}

function endsOf({ plannedEndAt }: VisitSummary): string[] {
  return plannedEndAt === null ? [] : [plannedEndAt];
}

/** A request standing on the rule over the window it wants. */
export interface StandingRequest {
  readonly visit: VisitSummary;
  readonly fromHour: number;
  readonly toHour: number;
  /** How many stand below it. */
  readonly level: number;
}

/** Requests over their windows; those of one window stand on one another, the first in line lowest. */
export function standRequests(board: DayBoard): StandingRequest[] {
  const { date, zone } = board;
  const standing: StandingRequest[] = [];
  for (const visit of board.requests) {
    const fromHour = hoursOn(date, visit.window.startAt, zone);
    const toHour = hoursOn(date, visit.window.endAt, zone);
    const below = standing.filter((other) => other.fromHour < toHour && other.toHour > fromHour);
    standing.push({ visit, fromHour, toHour, level: Math.max(-1, ...below.map(({ level }) => level)) + 1 });
  }
  return standing;
}

export interface BoardCounts {
  readonly visits: number;
  readonly room: number;
  readonly up: number;
  readonly open: number;
}

/** How full the day is, and how much of it stands ready. */
export function boardCounts(board: DayBoard): BoardCounts {
  const visits = board.inspectors.flatMap((inspector) => inspector.visits);
  const open = visits.filter(({ state }) => state === 'booked' || state === 'ready' || state === 'underway');
  return {
    visits: visits.length,
    room: board.day.windows.reduce((sum, { room }) => sum + room, 0),
    up: open.filter(({ state }) => state !== 'booked').length,
    open: open.length,
  };
}

/** Booked visits of the day whose tests are not up, by the time they must be. */
export function notUpYet(board: DayBoard): VisitSummary[] {
  return board.inspectors
    .flatMap((inspector) => inspector.visits)
    .filter(({ state, systemsUp }) => state === 'booked' && systemsUp.length > 0)
    .sort(byTime);
}
