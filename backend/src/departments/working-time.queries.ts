import { Injectable } from '@nestjs/common';
import type { NoticeAnswer, NoticeWindow } from '@holdwater/shared-types/scheduling/notice.contract.js';
import { Temporal } from 'temporal-polyfill';
import { cutoffForDates } from '../scheduling/working-time/cutoff-for-dates.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { computeNotice } from '../scheduling/working-time/notice.js';
import { windowsOfDates } from '../scheduling/working-time/windows-of-dates.js';
import { isWorkingDay } from '../scheduling/working-time/working-days.js';
import { ClosuresQueries } from './closures.queries.js';
import { daysOff } from './days-off.js';
import { DepartmentsQueries } from './departments.queries.js';
import { RuleCardsQueries, type RuleCardVersion } from './rule-cards.queries.js';
import { type ClosedPart, closedOf, firstYearNeeded, lastYearNeeded, ruleOf, yearOf } from './working-rule.js';

/** A window of a day with the rule card version that makes it and how many visits it takes. */
export interface DepartmentWindow extends NoticeWindow {
  readonly ruleCardId: string;
  readonly room: number;
}

export interface DepartmentNotice extends Omit<NoticeAnswer, 'windows'> {
  readonly zone: string;
  /** The version in force today: it sets cut-off, days ahead and horizon. */
  readonly ruleCard: RuleCardVersion;
  /** Each day's windows by the version in force on that day. */
  readonly windows: DepartmentWindow[];
}

/** A day of the department's calendar. */
export interface DepartmentDay {
  readonly date: string;
  readonly isWorkingDay: boolean;
  readonly closed: readonly ClosedPart[];
}

/** A department's working time: rule cards, holidays and closures put together for the pure rules of scheduling. */
@Injectable()
export class WorkingTimeQueries {
  constructor(
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly closures: ClosuresQueries,
  ) {}

  /** Which windows a request made now may ask for. Throws `no-rule-card` when none is in force today. */
  async noticeFor(departmentId: string, now: Date): Promise<DepartmentNotice> {
    const { zone } = await this.departments.getDepartment(departmentId);
    const today = localDateOf(now, zone);
    const ruleCard = await this.ruleCards.getRuleCardInForce(departmentId, today);
    const closures = await this.closures.listClosures(departmentId, today);
    const { windows: _, ...notice } = computeNotice({
      ...ruleOf(zone, ruleCard, closures, today, lastYearNeeded(today, ruleCard)),
      now: now.toISOString(),
      windows: [],
    });
    const windows = await this.windowsBetween(departmentId, notice.firstDate, notice.lastDate);
    return { ...notice, zone, ruleCard, windows };
  }

  /** Every window from one day to another, both included, each by the version in force on its day; days without one have none. */
  async windowsBetween(departmentId: string, fromDate: string, toDate: string): Promise<DepartmentWindow[]> {
    const { zone } = await this.departments.getDepartment(departmentId);
    const versions = await this.ruleCards.listInForceBetween(departmentId, fromDate, toDate);
    const closures = await this.closures.listClosures(departmentId, fromDate, toDate);
    return versions.flatMap((version) => {
      const [from, to] = shared(version, fromDate, toDate);
      const rooms = new Map(version.content.asking.windows.map(({ label, room }) => [label, room]));
      return windowsOfDates(ruleOf(zone, version, closures, from, yearOf(to)), from, to).map((window) => ({
        ...window,
        ruleCardId: version.id,
        room: rooms.get(window.label) ?? 0,
      }));
    });
  }

  /** Until when a request opens each of these days, past ones too. Empty when no rule card is in force today: it sets the cut-off. */
  async cutoffsFor(departmentId: string, dates: readonly string[], now: Date): Promise<Map<string, Date>> {
    const [first, last] = [dates.at(0), dates.at(-1)];
    const ruleCard = (await this.ruleCards.listInForce([departmentId], now)).get(departmentId);
    if (first === undefined || last === undefined || ruleCard === undefined) return new Map();
    const { zone } = await this.departments.getDepartment(departmentId);
    const fromDate = `${firstYearNeeded(first, ruleCard)}-01-01`;
    const closures = await this.closures.listClosures(departmentId, fromDate, last);
    return cutoffForDates(ruleOf(zone, ruleCard, closures, fromDate, yearOf(last)), dates);
  }

  /** What is closed on a day, and whether it is a working day at all. */
  async closedOn(departmentId: string, date: string): Promise<DepartmentDay> {
    const [day] = await this.daysBetween(departmentId, date, date);
    return day ?? { date, isWorkingDay: false, closed: [] };
  }

  /** Every day from one to another, both included, with what is closed on it. */
  async daysBetween(departmentId: string, fromDate: string, toDate: string): Promise<DepartmentDay[]> {
    const { zone } = await this.departments.getDepartment(departmentId);
    const versions = await this.ruleCards.listInForceBetween(departmentId, fromDate, toDate);
    const closures = await this.closures.listClosures(departmentId, fromDate, toDate);
    return datesFrom(fromDate, toDate).map((date) => {
      const version = versions.find((each) => rules(each, date));
      if (!version) return { date, isWorkingDay: false, closed: closedOf(zone, date, closures, []) };
      const rule = ruleOf(zone, version, closures, date, yearOf(date));
      const holidays = daysOff(version.content.asking.holidays, yearOf(date), yearOf(date)).filter(
        (day) => day.date === date,
      );
      return { date, isWorkingDay: isWorkingDay(rule, date), closed: closedOf(zone, date, closures, holidays) };
    });
  }
}

function rules(version: RuleCardVersion, date: string): boolean {
  return (version.effectiveFrom ?? date) <= date && date <= (version.effectiveTo ?? date);
}

/** The part of a span that a version rules. */
function shared(version: RuleCardVersion, fromDate: string, toDate: string): [string, string] {
  const from = version.effectiveFrom !== null && version.effectiveFrom > fromDate ? version.effectiveFrom : fromDate;
  const to = version.effectiveTo !== null && version.effectiveTo < toDate ? version.effectiveTo : toDate;
  return [from, to];
}

function datesFrom(fromDate: string, toDate: string): string[] {
  const dates: string[] = [];
  const last = Temporal.PlainDate.from(toDate);
  for (
    let day = Temporal.PlainDate.from(fromDate);
    Temporal.PlainDate.compare(day, last) <= 0;
    day = day.add({ days: 1 })
  ) {
    dates.push(day.toString());
  }
  return dates;
}
