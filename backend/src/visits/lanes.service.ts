import { Injectable } from '@nestjs/common';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { readCalendar } from '@holdwater/shared-types/visits/calendar.contract.js';
import { Clock } from '../common/time/clock.js';
import type { DepartmentRecord } from '../departments/departments.queries.js';
import { type DepartmentDay, WorkingTimeQueries } from '../departments/working-time.queries.js';
import { BookingQueries, type TakenPlace } from './booking.queries.js';
import { type DayWindow, DepartmentWindows, keyOf } from './department-windows.queries.js';
import { roomLeftOf } from './offers.service.js';
import type { DaySpan } from './visits.queries.js';
import { type OpenDays, whyNotByTime } from './why-not.js';

export type Lane = RouteAnswer<typeof readCalendar>['lanes'][number];
export type LaneDay = Lane['days'][number];

interface LaneFacts {
  readonly now: Date;
  readonly isOwn: boolean;
  /** Null for the own department, which is bound by no cut-off. */
  readonly openDays: OpenDays | null;
  readonly taken: readonly TakenPlace[];
  /** By date; empty where no version is in force today. */
  readonly cutoffs: ReadonlyMap<string, Date>;
}

/** A department's days with their windows, room and closures, as much of it as the reader may know. */
@Injectable()
export class Lanes {
  constructor(
    private readonly workingTime: WorkingTimeQueries,
    private readonly windows: DepartmentWindows,
    private readonly queries: BookingQueries,
    private readonly clock: Clock,
  ) {}

  /** `ruleCardVersion` null: no version is in force today, so nothing can be asked for. */
  async read(
    department: DepartmentRecord,
    span: DaySpan,
    isOwn: boolean,
    ruleCardVersion: number | null,
  ): Promise<Lane> {
    const days = await this.readDays(department.id, span, isOwn, ruleCardVersion !== null);
    return { departmentId: department.id, name: department.name, zone: department.zone, isOwn, ruleCardVersion, days };
  }

  async readDays(
    departmentId: string,
    { fromDate, toDate }: DaySpan,
    isOwn: boolean,
    isInForce: boolean,
  ): Promise<LaneDay[]> {
    const now = this.clock.now();
    const days = await this.workingTime.daysBetween(departmentId, fromDate, toDate);
    const windows = (await this.windows.list(departmentId, fromDate, toDate)).filter(({ isClosed }) => !isClosed);
    const taken = await this.queries.listTaken(departmentId, fromDate, toDate);
    const openDays = isOwn ? null : isInForce ? await this.workingTime.noticeFor(departmentId, now) : noDays;
    const dates = days.map(({ date }) => date);
    const cutoffs = await this.workingTime.cutoffsFor(departmentId, dates, now);
    const facts = { now, isOwn, openDays, taken, cutoffs };
    return days.map((day) =>
      dayOf(
        day,
        windows.filter(({ date }) => date === day.date),
        facts,
      ),
    );
  }
}

const noDays: OpenDays = { firstDate: '9999-12-31', lastDate: '9999-12-31' };

function dayOf(
  { date, isWorkingDay, closed }: DepartmentDay,
  windows: readonly DayWindow[],
  facts: LaneFacts,
): LaneDay {
  return {
    date,
    isWorkingDay,
    // a day off has no words of the department: its code stands for it, and pages word it
    closed: closed.map(({ from, to, why, holidayCode }) => ({ from, to, why: why || (holidayCode ?? '') })),
    windows: windows.map((window) => windowOf(window, facts)),
  };
}

function windowOf(window: DayWindow, { now, isOwn, openDays, taken, cutoffs }: LaneFacts): LaneDay['windows'][number] {
  const { date, label, startAt, endAt, room } = window;
  const here = taken.filter((place) => keyOf(place) === keyOf(window));
  const roomLeft = roomLeftOf(window, here);
  const isTakeable = roomLeft > 0 && whyNotByTime(window, openDays, now) === null;
  return {
    date,
    label,
    startAt,
    endAt,
    room,
    roomLeft,
    up: isOwn ? here.filter(({ isUp }) => isUp).length : null,
    isTakeable,
    cutoffAt: earlierOf(cutoffs.get(date), startAt),
  };
}

/** Nobody asks for a window that has begun, whatever the cut-off says. */
function earlierOf(cutoff: Date | undefined, startAt: string): string | null {
  if (cutoff === undefined) return null;
  return new Date(Math.min(cutoff.getTime(), Date.parse(startAt))).toISOString();
}
