import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { useTranslation } from 'react-i18next';
import { ApiError, isApiError, type ApiErrorCode } from './api-error';
import { useLocale } from './i18n';
import { dateWords, dayClockWords, durationWords } from './time';

export interface ErrorWords {
  readonly title: string;
  /** What is safe. */
  readonly safe: string;
  /** What to do next. */
  readonly next: string;
  readonly entry: string | null;
  readonly code: ApiErrorCode;
}

const instantPattern = /^\d{4}-\d\d-\d\dT\d\d:\d\d/;
const datePattern = /^\d{4}-\d\d-\d\d$/;

/** Values for the words: instants and dates as the reader writes them, in the zone the error names, else the reader's own. */
export function errorParams(params: Record<string, unknown>, locale: Locale): Record<string, unknown> {
  const zone = typeof params['zone'] === 'string' ? params['zone'] : Intl.DateTimeFormat().resolvedOptions().timeZone;
  const worded = Object.entries(params).map(([name, value]): [string, unknown] => [
    name,
    valueWords(value, zone, locale),
  ]);
  return Object.fromEntries(worded);
}

function valueWords(value: unknown, zone: string, locale: Locale): unknown {
  if (typeof value !== 'string') return value;
  if (instantPattern.test(value)) return dayClockWords(value, zone, locale);
  return datePattern.test(value) ? dateWords(value, locale) : value;
}

/** The words of an error, or null for none: what happened, what is safe, what to do next. */
export function useErrorWords(error: unknown): ErrorWords | null {
  const { t, i18n } = useTranslation('errors');
  const locale = useLocale();
  const markWord = (mark: string): string | null => (i18n.exists(`marks.${mark}`) ? t(`marks.${mark}`) : null);
  if (error === null || error === undefined) return null;
  const fault = isApiError(error) ? error : new ApiError('unknown', { status: 0 });
  const params = { ...errorParams(fault.params, locale), ...finerParams(fault, locale, markWord) };
  return {
    title: t(`${fault.code}.title`, params),
    safe: t(`${fault.code}.safe`, params),
    next: t(`${fault.code}.next`, params),
    entry: fault.entry,
    code: fault.code,
  };
}

/** The value that gives a refusal finer words, `errors:<code>.safe_named`: how many tries are left, which day is the first. */
const namedBy: Partial<Record<ApiErrorCode, string>> = {
  'not-found': 'what',
  'sign-in-failed': 'triesLeft',
  'sign-in-throttled': 'retryAfterSeconds',
  'stale-state': 'is',
  'too-many-lots': 'most',
  'cut-off-passed': 'firstDate',
  'beyond-horizon': 'lastDate',
  'reading-out-of-gauge': 'rangePsi',
  'correction-unfixed': 'number',
};

function finerParams(
  { code, params }: ApiError,
  locale: Locale,
  markWord: (mark: string) => string | null,
): Record<string, unknown> {
  const name = namedBy[code];
  const value = name === undefined ? undefined : params[name];
  if (value === undefined || value === null) return {};
  if (code === 'not-found') return { context: value };
  if (code === 'sign-in-failed') return { context: 'named', count: value };
  if (code === 'sign-in-throttled')
    return { context: 'named', wait: durationWords(Math.ceil(Number(value) / 60), locale) };
  if (code !== 'stale-state') return { context: 'named' };
  const word = markWord(typeof value === 'string' ? value : '');
  return word === null ? {} : { context: 'named', is: word };
}

/** Words of one field's fault, by the code the contract gives (`required`, `too-long`); an unknown one says it is not right. */
export function useFieldWords(): (fault: string | undefined) => string | undefined {
  const { t } = useTranslation('errors');
  return (fault) => (fault === undefined ? undefined : t([`fields.${fault}`, 'fields.wrong']));
}
