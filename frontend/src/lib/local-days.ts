import { Temporal } from 'temporal-polyfill';

/** Monday to Friday, as ISO weekdays. */
const lastWorkingWeekday = 5;

/** The day of an instant on the wall calendar of a zone, `2026-04-15`. */
export function localDateOf(instant: string | Date, zone: string): string {
  return zonedOf(instant, zone).toPlainDate().toString();
}

/** Minutes since midnight on the wall clock of a zone. */
export function minutesOfDay(instant: string | Date, zone: string): number {
  const { hour, minute } = zonedOf(instant, zone);
  return hour * 60 + minute;
}

/** Hours since midnight on the wall clock of a zone, with a fraction. */
export function hoursOfDay(instant: string | Date, zone: string): number {
  return minutesOfDay(instant, zone) / 60;
}

export function addDays(date: string, days: number): string {
  return Temporal.PlainDate.from(date).add({ days }).toString();
}

/** Whole days from one date to another; negative when it lies before. */
export function daysBetween(from: string, to: string): number {
  return Temporal.PlainDate.from(from).until(Temporal.PlainDate.from(to), { largestUnit: 'days' }).days;
}

/** ISO weekday, Monday 1. */
export function weekdayOf(date: string): number {
  return Temporal.PlainDate.from(date).dayOfWeek;
}

/** The Monday of a date's week. */
export function mondayOf(date: string): string {
  return addDays(date, 1 - weekdayOf(date));
}

/** The Monday of the working week that matters on a date: on a weekend the coming one. */
export function workingMondayOf(date: string): string {
  return weekdayOf(date) > lastWorkingWeekday ? addDays(mondayOf(date), 7) : mondayOf(date);
}

/** Monday to Friday of the week of `date`. */
export function workWeekOf(date: string): string[] {
  const monday = mondayOf(date);
  return [0, 1, 2, 3, 4].map((day) => addDays(monday, day));
}

/** The ten days of two working weeks, from the Monday of `date`. */
export function twoWorkWeeksOf(date: string): string[] {
  return [...workWeekOf(date), ...workWeekOf(addDays(date, 7))];
}

/** The next day from Monday to Friday after `date`; a department's own closed days are the calendar's answer. */
export function nextWeekdayAfter(date: string): string {
  const next = addDays(date, 1);
  return weekdayOf(next) > lastWorkingWeekday ? nextWeekdayAfter(next) : next;
}

/** The instant of a wall-clock time; of two equal ones the first, as calendars take it (RFC 5545). */
export function instantOf(date: string, clockTime: string, zone: string): string {
  const wall = Temporal.PlainDate.from(date).toPlainDateTime(Temporal.PlainTime.from(clockTime));
  return wall.toZonedDateTime(zone, { disambiguation: 'compatible' }).toInstant().toString();
}

/** Whole minutes from one instant to another, rounded toward the first; negative when it lies before. */
export function minutesBetween(from: string | Date, to: string | Date): number {
  return Math.trunc((new Date(to).getTime() - new Date(from).getTime()) / 60_000);
}

function zonedOf(instant: string | Date, zone: string): Temporal.ZonedDateTime {
  return Temporal.Instant.fromEpochMilliseconds(new Date(instant).getTime()).toZonedDateTimeISO(zone);
}
