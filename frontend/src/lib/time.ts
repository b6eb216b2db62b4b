import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { useMemo } from 'react';
import { useLocale } from './i18n';

/** The reader's locale for Intl: the trade is in the States. */
const tags: Record<Locale, string> = { en: 'en-US', es: 'es-US' };

const formats = new Map<string, Intl.DateTimeFormat>();

function formatOf(locale: Locale, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${locale} ${JSON.stringify(options)}`;
  const known = formats.get(key) ?? new Intl.DateTimeFormat(tags[locale], options);
  formats.set(key, known);
  return known;
}

/** A date without a zone, as the instant that prints it in UTC. */
function noonOf(date: string): Date {
  return new Date(`${date}T12:00:00Z`);
}

/** "Wed, Apr 15" of a date without a zone. */
export function dateWords(date: string, locale: Locale): string {
  return formatOf(locale, { weekday: 'short', month: 'short', day: 'numeric', timeZone: 'UTC' }).format(noonOf(date));
}

/** "Wed, Apr 15, 2026": heads and print only. */
export function dateYearWords(date: string, locale: Locale): string {
  return formatOf(locale, {
    weekday: 'short',
    month: 'short',
    day: 'numeric',
    year: 'numeric',
    timeZone: 'UTC',
  }).format(noonOf(date));
}

/** "Apr 13 – 17, 2026" without the spaces our ranges do not have; `withYear` for heads. */
export function dateRangeWords(from: string, to: string, locale: Locale, withYear = false): string {
  const format = formatOf(locale, {
    month: 'short',
    day: 'numeric',
    year: withYear ? 'numeric' : undefined,
    timeZone: 'UTC',
  });
  return tight(format.formatRange(noonOf(from), noonOf(to)));
}

/** "Wed" of a date. */
export function weekdayWords(date: string, locale: Locale, width: 'short' | 'long' | 'narrow' = 'short'): string {
  return formatOf(locale, { weekday: width, timeZone: 'UTC' }).format(noonOf(date));
}

/** "Wed, Apr 15" of an instant, on the wall calendar of a zone. */
export function dayWords(instant: string | Date, zone: string, locale: Locale): string {
  return formatOf(locale, { weekday: 'short', month: 'short', day: 'numeric', timeZone: zone }).format(
    new Date(instant),
  );
}

/** "9:00 am" on the wall clock of a zone. */
export function clockWords(instant: string | Date, zone: string, locale: Locale): string {
  return lowerMarks(
    formatOf(locale, { hour: 'numeric', minute: '2-digit', timeZone: zone }).format(new Date(instant)),
    locale,
  );
}

/** "9:00–11:00 am", "11:00 am–1:00 pm": the first am or pm is left out when the second says it. */
export function windowWords(startAt: string | Date, endAt: string | Date, zone: string, locale: Locale): string {
  const format = formatOf(locale, { hour: 'numeric', minute: '2-digit', timeZone: zone });
  return lowerMarks(tight(format.formatRange(new Date(startAt), new Date(endAt))), locale);
}

/** "Thu, Apr 16, 9:00–11:00 am". */
export function dayWindowWords(startAt: string | Date, endAt: string | Date, zone: string, locale: Locale): string {
  return `${dayWords(startAt, zone, locale)}, ${windowWords(startAt, endAt, zone, locale)}`;
}

/** "Wed, Apr 15, 9:00 am". */
export function dayClockWords(instant: string | Date, zone: string, locale: Locale): string {
  return `${dayWords(instant, zone, locale)}, ${clockWords(instant, zone, locale)}`;
}

/** "Mountain Time": the zone named in words, once per page. */
export function zoneWords(zone: string, locale: Locale, at: string | Date = new Date()): string {
  const parts = formatOf(locale, { timeZone: zone, timeZoneName: 'longGeneric' }).formatToParts(new Date(at));
  const name = parts.find((part) => part.type === 'timeZoneName')?.value ?? zone;
  return name.charAt(0).toLocaleUpperCase(tags[locale]) + name.slice(1);
}

/** "today", "tomorrow", "yesterday"; null for any other day. */
export function nearDayWords(date: string, today: string, locale: Locale): string | null {
  // Days without a zone are all 24 h long.
  const days = (noonOf(date).getTime() - noonOf(today).getTime()) / 86_400_000;
  if (Math.abs(days) > 1) return null;
  return new Intl.RelativeTimeFormat(tags[locale], { numeric: 'auto' }).format(days, 'day');
}

/** "1 h 12 min", "45 min", "2 days 3 h": the two largest units; whole minutes, never negative. */
export function durationWords(minutes: number, locale: Locale): string {
  const whole = Math.max(0, Math.trunc(minutes));
  const [days, hours, rest] = [Math.trunc(whole / 1440), Math.trunc((whole % 1440) / 60), whole % 60];
  if (days > 0) return joined([dayCount(days, locale), hours > 0 ? `${hours} h` : '']);
  return joined([hours > 0 ? `${hours} h` : '', rest > 0 || hours === 0 ? `${rest} min` : '']);
}

function dayCount(days: number, locale: Locale): string {
  return new Intl.NumberFormat(tags[locale], { style: 'unit', unit: 'day', unitDisplay: 'long' }).format(days);
}

function joined(parts: string[]): string {
  return parts.filter((part) => part !== '').join(' ');
}

/** Intl sets thin spaces around its en dash and before am; the sheet sets none around the dash and a plain one before am. */
function tight(words: string): string {
  return words.replace(/\s*–\s*/g, '–');
}

function lowerMarks(words: string, locale: Locale): string {
  const plain = words.replace(/[\u00a0\u202f\u2009]/g, ' ');
  return locale === 'en' ? plain.replace(/ (AM|PM)/g, (mark) => mark.toLowerCase()) : plain;
}

/** Every time word in the reader's language. */
export function useTimeWords() {
  const locale = useLocale();
  return useMemo(
    () => ({
      date: (date: string) => dateWords(date, locale),
      dateYear: (date: string) => dateYearWords(date, locale),
      dateRange: (from: string, to: string, withYear = false) => dateRangeWords(from, to, locale, withYear),
      weekday: (date: string, width: 'short' | 'long' | 'narrow' = 'short') => weekdayWords(date, locale, width),
      day: (instant: string | Date, zone: string) => dayWords(instant, zone, locale),
      clock: (instant: string | Date, zone: string) => clockWords(instant, zone, locale),
      window: (startAt: string | Date, endAt: string | Date, zone: string) => windowWords(startAt, endAt, zone, locale),
      dayWindow: (startAt: string | Date, endAt: string | Date, zone: string) =>
        dayWindowWords(startAt, endAt, zone, locale),
      dayClock: (instant: string | Date, zone: string) => dayClockWords(instant, zone, locale),
      zone: (zone: string, at?: string | Date) => zoneWords(zone, locale, at),
      nearDay: (date: string, today: string) => nearDayWords(date, today, locale),
      duration: (minutes: number) => durationWords(minutes, locale),
    }),
    [locale],
  );
}
export type TimeWords = ReturnType<typeof useTimeWords>;
