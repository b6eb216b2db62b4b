import type { NoticeInput } from '@holdwater/shared-types/scheduling/notice.contract.js';
import { closedSpansOf } from '../scheduling/working-time/closed-spans.js';
import type { ClosureRecord } from './closures.queries.js';
import { type DayOff, daysOff } from './days-off.js';
import type { RuleCardVersion } from './rule-cards.queries.js';

/** What is closed on a day. Instants; both null for a whole day. */
export interface ClosedPart {
  readonly from: string | null;
  readonly to: string | null;
  /** The department's own words; empty for a holiday. */
  readonly why: string;
  /** A federal holiday's code, or `own` for a day the rule card adds. */
  readonly holidayCode: string | null;
}

/** Puts a rule card, its days off up to a year and the closures into the one shape the rules of working time take. */
export function ruleOf(
  zone: string,
  version: RuleCardVersion,
  closures: readonly ClosureRecord[],
  from: string,
  toYear: number,
): Omit<NoticeInput, 'now'> {
  const { asking } = version.content;
  return {
    zone,
    workingDays: asking.workingDays,
    closures: [...daysOff(asking.holidays, yearOf(from), toYear).map(({ date }) => date), ...closures.map(closureOf)],
    cutoff: asking.cutoff,
    workingDaysAhead: asking.workingDaysAhead,
    horizonWorkingDays: asking.horizonWorkingDays,
    windows: asking.windows,
  };
}

export function closedOf(
  zone: string,
  date: string,
  closures: readonly ClosureRecord[],
  holidays: readonly DayOff[],
): ClosedPart[] {
  const ofHolidays = holidays.map(({ code }) => ({ from: null, to: null, why: '', holidayCode: code ?? 'own' }));
  const ofClosures = closures.flatMap((closure) =>
    closedSpansOf({ zone, closures: [closureOf(closure)] }, date).map((span) => ({
      from: span.from === null ? null : span.startAt,
      to: span.to === null ? null : span.endAt,
      why: closure.why,
      holidayCode: null,
    })),
  );
  return [...ofHolidays, ...ofClosures];
}

/** Far enough ahead that no day of the horizon lies in a year whose holidays were not looked at; a weekly day has at least 40 a year. */
export function lastYearNeeded(today: string, { content: { asking } }: RuleCardVersion): number {
  const days = asking.workingDaysAhead + asking.horizonWorkingDays;
  return yearOf(today) + 1 + Math.ceil(days / (40 * new Set(asking.workingDays).size));
}

/** Far enough back that no day counted back from a date lies in a year that was not looked at. */
export function firstYearNeeded(date: string, { content: { asking } }: RuleCardVersion): number {
  return yearOf(date) - 1 - Math.ceil(asking.workingDaysAhead / (40 * new Set(asking.workingDays).size));
}

export function yearOf(date: string): number {
  return Number(date.slice(0, 4));
}

function closureOf({ date, from, to }: ClosureRecord) {
  return from === null || to === null ? date : { date, from, to };
}
