import { Temporal } from 'temporal-polyfill';
import { zone as zoneName } from '@holdwater/shared-types/common/fields.js';

const minuteMs = 60_000;
const dayMs = 24 * 60 * minuteMs;

/**
 * The instant of a wall clock's time in a zone. A time that a change of clocks repeats means the first; one that it skips takes the
 * offset before the gap (RFC 5545 §3.3.5, which is Temporal's "compatible" and never luxon's choice).
 * @param date `2027-03-14`
 * @param clockTime `07:30`
 * @throws RangeError when the date, the time or the zone does not exist
 */
export function instantOf(date: string, clockTime: string, zone: string): Date {
  return instantOnDay(Temporal.PlainDate.from(date), clockTime, zone);
}

/**
 * The calendar day it is in a zone at an instant.
 * @throws RangeError when the zone does not exist or the instant is invalid
 */
export function localDateOf(instant: Date, zone: string): string {
  const at = Temporal.Instant.fromEpochMilliseconds(instant.getTime());
  return at.toZonedDateTimeISO(zone).toPlainDate().toString();
}

/** Whether this machine knows a time zone by that IANA name; the same rule as the contracts use. */
export function isZone(name: string): boolean {
  return zoneName.safeParse(name).success;
}

/** The first instant of a day in a zone; not always midnight, because some zones skip it. */
export function startOfDay(date: Temporal.PlainDate, zone: string): Date {
  return new Date(date.toZonedDateTime(zone).epochMilliseconds);
}

/**
 * Reads clock times of one day in one zone, equal to `instantOf` and many times faster: on a day of exactly 24 hours a clock time is
 * plain minutes after the day's start; only the two days a year on which clocks change need looking up.
 */
export function dayClock(date: Temporal.PlainDate, zone: string): (clockTime: string) => Date {
  const startMs = startOfDay(date, zone).getTime();
  const isPlainDay = startOfDay(date.add({ days: 1 }), zone).getTime() - startMs === dayMs;
  if (!isPlainDay) return (clockTime) => instantOnDay(date, clockTime, zone);
  return (clockTime) => new Date(startMs + minutesOfDay(clockTime) * minuteMs);
}

function instantOnDay(date: Temporal.PlainDate, clockTime: string, zone: string): Date {
  const plainTime = Temporal.PlainTime.from(clockTime);
  return new Date(date.toZonedDateTime({ timeZone: zone, plainTime }).epochMilliseconds);
}

function minutesOfDay(clockTime: string): number {
  return Number(clockTime.slice(0, 2)) * 60 + Number(clockTime.slice(3, 5));
}
