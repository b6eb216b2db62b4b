import type { Locale } from '@holdwater/shared-types/common/locale.js';
import type { TFunction } from 'i18next';
import { useMemo } from 'react';
import { useTranslation } from 'react-i18next';
import { localName, useLocale } from '../../lib/i18n';
import { clockWords, weekdayWords, windowWords } from '../../lib/time';

/** What the notes of a rule card are worded with. */
export interface RuleCardWords {
  readonly t: TFunction;
  readonly locale: Locale;
  readonly clock: (time: string) => string;
  readonly span: (start: string, end: string) => string;
  readonly days: (days: readonly number[]) => string;
  readonly name: (own: { en: string; es?: string }) => string;
}

/** A clock time of any day, as an instant that prints it in UTC. */
const anyDay = (time: string): string => `2024-01-01T${time}:00Z`;

/** ISO weekday 1 to 7 in the reader's words; January 1, 2024 is a Monday. */
const weekday = (day: number, locale: Locale): string => weekdayWords(`2024-01-0${day}`, locale);

/** "Mon–Thu", or "Tue, Thu" where days are missing between. */
export function weekdaysWords(days: readonly number[], locale: Locale): string {
  const sorted = [...new Set(days)].sort((a, b) => a - b);
  const [first] = sorted;
  const last = sorted[sorted.length - 1];
  if (first === undefined || last === undefined) return '';
  const isRow = sorted.length > 2 && last - first === sorted.length - 1;
  if (isRow) return `${weekday(first, locale)}–${weekday(last, locale)}`;
  return sorted.map((day) => weekday(day, locale)).join(', ');
}

export function useRuleCardWords(): RuleCardWords {
  const { t } = useTranslation(['departments', 'common']);
  const locale = useLocale();
  return useMemo(
    () => ({
      t,
      locale,
      clock: (time) => clockWords(anyDay(time), 'UTC', locale),
      span: (start, end) => windowWords(anyDay(start), anyDay(end), 'UTC', locale),
      days: (days) => weekdaysWords(days, locale),
      name: (own) => localName(own, locale),
    }),
    [t, locale],
  );
}
