import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Run, RunStop } from './api/run';
import { hoursOn, startOf } from './calendar-model';
import { isGone, isOpen } from './visit-look';

/** The day as a road of hours. */
export interface RunHours {
  readonly from: number;
  readonly length: number;
}

/** Whole hours from before the first stop to after the last; a working day when there is none. */
export function runHours({ date, zone, stops }: Run): RunHours {
  const starts = stops.map(({ visit }) => hoursOn(date, startOf(visit), zone));
  const ends = stops.map(({ visit }) => hoursOn(date, visit.plannedEndAt ?? visit.window.endAt, zone));
  const from = Math.floor(Math.min(8, ...starts));
  const to = Math.ceil(Math.max(from + 8, ...ends));
  return { from, length: to - from };
}

/** The stop to go to: the one underway, else the first still to be made. */
export function nextStop(stops: readonly RunStop[]): RunStop | null {
  return (
    stops.find(({ visit }) => visit.state === 'underway') ??
    stops.find(({ visit }) => visit.state === 'booked' || visit.state === 'ready') ??
    null
  );
}

/** How many stops are behind: closed with an outcome. */
export function doneCount(stops: readonly RunStop[]): number {
  return stops.filter(({ visit }) => visit.state === 'closed').length;
}

/** How many count as stops: those that went away are struck. */
export function stopCount(stops: readonly RunStop[]): number {
  return stops.filter(({ visit }) => !isGone(visit)).length;
}

export interface RunWindow {
  readonly startAt: string;
  readonly endAt: string;
  readonly firstStop: string;
  readonly lastStop: string;
}

/** The windows of the day that stops stand in, each with its first and last. */
export function runWindows(stops: readonly RunStop[]): RunWindow[] {
  const windows: RunWindow[] = [];
  for (const { visit } of stops) {
    const known = windows.findIndex(({ startAt, endAt }) => sameWindow(visit, startAt, endAt));
    const before = windows[known];
    if (before === undefined) {
      const { startAt, endAt } = visit.window;
      windows.push({ startAt, endAt, firstStop: visit.id, lastStop: visit.id });
    } else {
      windows[known] = { ...before, lastStop: visit.id };
    }
  }
  return windows;
}

function sameWindow({ window }: VisitSummary, startAt: string, endAt: string): boolean {
  return window.startAt === startAt && window.endAt === endAt;
}

/** Where navigation leads: the coordinates where they are known, else the address in words (RFC 5870 and its common `q`). */
export function directionsTo({ visit, latitude, longitude }: RunStop): string {
  const words = encodeURIComponent(visit.address);
  return latitude === null || longitude === null
    ? `geo:0,0?q=${words}`
    : `geo:${latitude},${longitude}?q=${latitude},${longitude}`;
}

/** Why a visit cannot begin yet: before its window only a test that is up lets it. */
export function beginBlock(visit: VisitSummary, nowMs: number): 'ended' | 'windowOpens' | 'notYours' | null {
  if (visit.moves.includes('begin')) return null;
  if (!isOpen(visit) || visit.state === 'requested') return 'ended';
  return visit.state === 'booked' && Date.parse(visit.window.startAt) > nowMs ? 'windowOpens' : 'notYours';
}
