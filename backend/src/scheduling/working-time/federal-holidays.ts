import { Temporal } from 'temporal-polyfill';

export type FederalHolidayCode = (typeof federalHolidays)[number]['code'];

/** One day off; `code` is null for a day the department added itself. */
export interface Holiday {
  readonly date: string;
  readonly code: FederalHolidayCode | null;
}

/** How a department departs from the federal list. */
export interface HolidayChoice {
  readonly addedDates?: readonly string[];
  readonly droppedDates?: readonly string[];
  /** Holidays never kept, whatever the year. */
  readonly droppedHolidays?: readonly FederalHolidayCode[];
}

const monday = 1;
const thursday = 4;
const saturday = 6;
const sunday = 7;

/** The law as it reads since this year: before it other days were kept (Monday holidays and Veterans Day moved, 1971 and 1978). */
const firstYear = 1986;

/** 5 U.S.C. 6103(a), with the first year of those younger than the list (Pub. L. 98-144 and 117-17). */
const federalHolidays = [
  { code: 'new-years-day', since: firstYear, on: (year: number) => dateOf(year, 1, 1) },
  { code: 'martin-luther-king-day', since: 1986, on: (year: number) => nthWeekday(year, 1, monday, 3) },
  { code: 'washingtons-birthday', since: firstYear, on: (year: number) => nthWeekday(year, 2, monday, 3) },
  {
    code: 'memorial-day',
    since: firstYear,
    on: (year: number) => nthWeekday(year, 6, monday, 1).subtract({ days: 7 }),
  },
  { code: 'juneteenth', since: 2021, on: (year: number) => dateOf(year, 6, 19) },
  { code: 'independence-day', since: firstYear, on: (year: number) => dateOf(year, 7, 4) },
  { code: 'labor-day', since: firstYear, on: (year: number) => nthWeekday(year, 9, monday, 1) },
  { code: 'columbus-day', since: firstYear, on: (year: number) => nthWeekday(year, 10, monday, 2) },
  { code: 'veterans-day', since: firstYear, on: (year: number) => dateOf(year, 11, 11) },
  { code: 'thanksgiving-day', since: firstYear, on: (year: number) => nthWeekday(year, 11, thursday, 4) },
  { code: 'christmas-day', since: firstYear, on: (year: number) => dateOf(year, 12, 25) },
] as const;

/**
 * The federal holidays observed within a calendar year, by date. One that falls on a Saturday is observed the Friday before
 * (5 U.S.C. 6103(b)(1)), on a Sunday the Monday after (E.O. 11582 §3(a)); so New Year's Day may be observed on the 31st of December
 * of the year before, and that year then has it twice.
 * @throws RangeError for a year before 1986, when the list was another
 */
export function observedFederalHolidays(year: number): Holiday[] {
  if (!Number.isInteger(year) || year < firstYear)
    throw new RangeError(`no federal holidays known for the year ${year}`);
  return [...observedOf(year), ...observedOf(year + 1)].filter(({ date }) => Number(date.slice(0, 4)) === year);
}

/**
 * A department's days off from one year to another, both included, by date: the federal list without what it drops, with what it
 * adds. A date both dropped and added is kept as added.
 */
export function departmentHolidays(fromYear: number, toYear: number, choice: HolidayChoice = {}): Holiday[] {
  const byDate = new Map<string, Holiday>();
  for (let year = fromYear; year <= toYear; year += 1) {
    for (const holiday of observedFederalHolidays(year))
      if (!isDropped(holiday, choice)) byDate.set(holiday.date, holiday);
  }
  for (const added of choice.addedDates ?? []) {
    const { year } = Temporal.PlainDate.from(added);
    if (year >= fromYear && year <= toYear && !byDate.has(added)) byDate.set(added, { date: added, code: null });
  }
  return [...byDate.values()].sort((a, b) => (a.date < b.date ? -1 : 1));
}

function isDropped({ date, code }: Holiday, choice: HolidayChoice): boolean {
  const isHolidayDropped = code !== null && (choice.droppedHolidays ?? []).includes(code);
  return isHolidayDropped || (choice.droppedDates ?? []).includes(date);
}

function observedOf(year: number): Holiday[] {
  return federalHolidays
    .filter(({ since }) => year >= since)
    .map(({ code, on }) => ({ code, date: observedDay(on(year)).toString() }));
}

function observedDay(date: Temporal.PlainDate): Temporal.PlainDate {
  if (date.dayOfWeek === saturday) return date.subtract({ days: 1 });
  if (date.dayOfWeek === sunday) return date.add({ days: 1 });
  return date;
}

function dateOf(year: number, month: number, day: number): Temporal.PlainDate {
  return Temporal.PlainDate.from({ year, month, day });
}

function nthWeekday(year: number, month: number, weekday: number, nth: number): Temporal.PlainDate {
  const first = dateOf(year, month, 1);
  return first.add({ days: ((weekday - first.dayOfWeek + 7) % 7) + 7 * (nth - 1) });
}
