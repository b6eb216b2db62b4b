import { html } from './html.js';
import type { Html } from './html.js';
import type { CalendarTime } from './read-calendar.js';

/** The zone this machine shows its times in; the page names it once. */
export const pageZone = new Intl.DateTimeFormat('en-US').resolvedOptions().timeZone;

/** "Wed, Apr 15" in the page's zone. */
export function dayOf(instant: string): string {
  return day(new Date(instant), pageZone);
}

/** "9:15 am" in the page's zone, numerals apart from the am or pm. */
export function clockOf(instant: string): Html {
  const { numerals, half } = clock(new Date(instant), pageZone);
  return html`<span class="nw"><span class="n">${numerals}</span> ${half}</span>`;
}

/** "Wed, Apr 15, 9:00–11:00 am, America/Denver": the span as the calendar file has it, not converted. */
export function spanOf(start: CalendarTime, end: CalendarTime | null): string {
  const from = asUtc(start);
  if (start.isWholeDay) return `${day(from, 'UTC')}, all day`;
  const { numerals, half } = clock(from, 'UTC');
  if (!end) return `${day(from, 'UTC')}, ${numerals} ${half}, ${start.zone}`;
  const to = asUtc(end);
  const last = clock(to, 'UTC');
  const isOneDay = day(from, 'UTC') === day(to, 'UTC') && start.year === end.year;
  const isOneZone = start.zone === end.zone;
  const head = `${day(from, 'UTC')}, ${numerals}`;
  if (isOneDay && isOneZone && half === last.half) return `${head}–${last.numerals} ${half}, ${start.zone}`;
  const middle = isOneZone ? '' : `, ${start.zone}`;
  const lastDay = isOneDay ? '' : `${day(to, 'UTC')}, `;
  return `${head} ${half}${middle} – ${lastDay}${last.numerals} ${last.half}, ${end.zone}`;
}

/** The clock's fields as if they were UTC, so that formatting them in UTC gives them back unchanged. */
function asUtc({ year, month, day: dayOfMonth, hour, minute }: CalendarTime): Date {
  return new Date(Date.UTC(year, month - 1, dayOfMonth, hour, minute));
}

function day(date: Date, timeZone: string): string {
  return new Intl.DateTimeFormat('en-US', { weekday: 'short', month: 'short', day: 'numeric', timeZone }).format(date);
}

function clock(date: Date, timeZone: string): { numerals: string; half: string } {
  const format = new Intl.DateTimeFormat('en-US', { hour: 'numeric', minute: '2-digit', hour12: true, timeZone });
  const parts = new Map(format.formatToParts(date).map(({ type, value }) => [type, value]));
  return {
    numerals: `${parts.get('hour')}:${parts.get('minute')}`,
    half: (parts.get('dayPeriod') ?? '').toLowerCase(),
  };
}
