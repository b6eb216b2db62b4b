import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { departmentHolidays, type FederalHolidayCode } from '../scheduling/working-time/federal-holidays.js';

export interface DayOff {
  readonly date: string;
  /** The federal holiday it is; null for a day the department added. */
  readonly code: FederalHolidayCode | null;
}

/** The federal list is known from this year on; before it a department has only its own days off. */
const firstFederalYear = 1986;

/** The days off of a rule card in some years, both included: the federal list as it is observed, with the department's adds and drops. */
export function daysOff(holidays: RuleCardContent['asking']['holidays'], fromYear: number, toYear: number): DayOff[] {
  const choice = { addedDates: holidays.adds, droppedDates: holidays.drops };
  if (holidays.federal && toYear >= firstFederalYear)
    return departmentHolidays(Math.max(fromYear, firstFederalYear), toYear, choice);
  const isWithin = (date: string) => Number(date.slice(0, 4)) >= fromYear && Number(date.slice(0, 4)) <= toYear;
  return [...new Set(holidays.adds)]
    .filter(isWithin)
    .sort()
    .map((date) => ({ date, code: null }));
}
