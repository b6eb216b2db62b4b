import { Injectable } from '@nestjs/common';
import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import { DepartmentsQueries } from '../departments/departments.queries.js';
import { RuleCardsQueries, type RuleCardVersion } from '../departments/rule-cards.queries.js';
import { WorkingTimeQueries } from '../departments/working-time.queries.js';
import { windowsOfDates } from '../scheduling/working-time/windows-of-dates.js';

/** A window of a department's day, closed ones too. */
export interface DayWindow {
  readonly date: string;
  readonly label: string;
  readonly startAt: string;
  readonly endAt: string;
  readonly room: number;
  readonly isClosed: boolean;
  /** The version in force on its day. */
  readonly ruleCard: RuleCardVersion;
}

@Injectable()
export class DepartmentWindows {
  constructor(
    private readonly departments: DepartmentsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly workingTime: WorkingTimeQueries,
  ) {}

  /** Every window from one day to another, both included: as the weekly rule has it, marked where a closure or a day off takes it out. */
  async list(departmentId: string, fromDate: string, toDate: string): Promise<DayWindow[]> {
    const { zone } = await this.departments.getDepartment(departmentId);
    const versions = await this.ruleCards.listInForceBetween(departmentId, fromDate, toDate);
    const open = new Set((await this.workingTime.windowsBetween(departmentId, fromDate, toDate)).map(keyOf));
    return versions.flatMap((ruleCard) => {
      const { windows, workingDays } = ruleCard.content.asking;
      const [from, to] = daysRuled(ruleCard, fromDate, toDate);
      const rooms = new Map(windows.map(({ label, room }) => [label, room]));
      return windowsOfDates({ zone, workingDays, closures: [], windows }, from, to)
        .filter(({ startAt, endAt }) => startAt < endAt) // a change of clocks may swallow a window whole
        .map((window) => ({
          ...window,
          room: rooms.get(window.label) ?? 0,
          isClosed: !open.has(keyOf(window)),
          ruleCard,
        }));
    });
  }

  /** One window; null when the rule card of that day has none of this label. */
  async find(departmentId: string, date: string, label: string): Promise<DayWindow | null> {
    return (await this.list(departmentId, date, date)).find((window) => window.label === label) ?? null;
  }
}

export function stageOf(ruleCard: RuleCardVersion, code: string): Stage | null {
  return ruleCard.content.stages.find((stage) => stage.code === code) ?? null;
}

export function keyOf({ date, label }: { date: string; label: string }): string {
  return `${date} ${label}`;
}

function daysRuled(version: RuleCardVersion, fromDate: string, toDate: string): [string, string] {
  const from = version.effectiveFrom !== null && version.effectiveFrom > fromDate ? version.effectiveFrom : fromDate;
  const to = version.effectiveTo !== null && version.effectiveTo < toDate ? version.effectiveTo : toDate;
  return [from, to];
}
