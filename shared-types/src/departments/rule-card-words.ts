import type { Locale } from '../common/locale.js';
import { englishRuleCardPhrases } from './rule-card-phrases.en.js';
import { spanishRuleCardPhrases } from './rule-card-phrases.es.js';

/** Phrases by key; a key with `_zero`, `_one`, `_many` or `_other` at its end is chosen by the value `count`. */
export interface RuleCardPhrases {
  readonly [key: string]: string | RuleCardPhrases;
}

/** Words of a department's own, Spanish where it has them. */
export interface OwnWords {
  readonly en: string;
  readonly es?: string | undefined;
}

/** What a rule card is put into words with, in one language. */
export interface RuleCardWords {
  readonly locale: Locale;
  readonly t: (key: string, values?: Readonly<Record<string, string | number>>) => string;
  /** The department's own words; `code` is told too where the words alone would not tell two values apart. */
  readonly name: (own: OwnWords, code?: string) => string;
  /** The words alone, or with what else tells them apart, such as a window's name. */
  readonly more: (words: string, detail: string) => string;
  /** "7:00 am" of `07:00`. */
  readonly clock: (time: string) => string;
  /** "7:30–9:00 am" of two clock times. */
  readonly span: (start: string, end: string) => string;
  /** "Mon–Thu", or "Tue, Thu" where days are missing between; ISO weekdays. */
  readonly days: (days: readonly number[]) => string;
  /** "Wed, Apr 15, 2026" of `2026-04-15`. */
  readonly date: (date: string) => string;
  /** "$65" of 6500 cents. */
  readonly money: (cents: number) => string;
}

const phrases: Readonly<Record<Locale, RuleCardPhrases>> = {
  en: englishRuleCardPhrases,
  es: spanishRuleCardPhrases,
};
const tags: Readonly<Record<Locale, string>> = { en: 'en-US', es: 'es-US' };

/** `isExact` tells codes and both languages of the department's own words, for changes that would else read the same. */
export function ruleCardWords(locale: Locale, isExact = false): RuleCardWords {
  const t = phraseFiller(locale);
  return {
    locale,
    t,
    name: (own, code) => (isExact ? exactName(own, code, t) : ((locale === 'es' ? own.es : undefined) ?? own.en)),
    more: (words, detail) => (isExact ? t('says.sameWords', { words, code: detail }) : words),
    clock: (time) => plain(clockFormat(locale).format(anyDay(time)), locale),
    span: (start, end) => plain(clockFormat(locale).formatRange(anyDay(start), anyDay(end)), locale),
    days: (days) => weekdaysWords(days, locale),
    date: (date) =>
      new Intl.DateTimeFormat(tags[locale], {
        ...{ weekday: 'short', month: 'short', day: 'numeric', year: 'numeric', timeZone: 'UTC' },
      }).format(new Date(`${date}T12:00:00Z`)),
    money: (cents) =>
      new Intl.NumberFormat(tags[locale], {
        ...{ style: 'currency', currency: 'USD', maximumFractionDigits: 2, minimumFractionDigits: cents % 100 && 2 },
      }).format(cents / 100),
  };
}

/** "Mon–Thu", or "Tue, Thu" where days are missing between. */
export function weekdaysWords(days: readonly number[], locale: Locale): string {
  const sorted = [...new Set(days)].sort((a, b) => a - b);
  const [first] = sorted;
  const last = sorted.at(-1);
  if (first === undefined || last === undefined) return '';
  const isRow = sorted.length > 2 && last - first === sorted.length - 1;
  return isRow
    ? `${weekday(first, locale)}–${weekday(last, locale)}`
    : sorted.map((day) => weekday(day, locale)).join(', ');
}

function phraseFiller(locale: Locale): RuleCardWords['t'] {
  const plural = new Intl.PluralRules(tags[locale]);
  return (key, values = {}) => {
    const { count } = values;
    const forms =
      typeof count === 'number' ? [...(count === 0 ? ['_zero'] : []), `_${plural.select(count)}`, '_other'] : [];
    const found = [...forms.map((form) => key + form), key].map((each) => phraseAt(locale, each)).find(Boolean);
    if (found === undefined) throw new Error(`no phrase of a rule card: ${locale} ${key}`);
    return found.replaceAll(/\{\{(\w+)\}\}/g, (_whole, name: string) => String(values[name] ?? ''));
  };
}

function phraseAt(locale: Locale, key: string): string | undefined {
  const found = key
    .split('.')
    .reduce<string | RuleCardPhrases | undefined>(
      (part, name) => (typeof part === 'object' ? part[name] : undefined),
      phrases[locale],
    );
  return typeof found === 'string' ? found : undefined;
}

function exactName({ en, es }: OwnWords, code: string | undefined, t: RuleCardWords['t']): string {
  const words = es === undefined ? t('says.onlyEnglish', { en }) : t('says.inBoth', { en, es });
  return code === undefined ? words : t('says.sameWords', { words, code });
}

/** A clock time of any day, as an instant that prints it in UTC. */
function anyDay(time: string): Date {
  return new Date(`2024-01-01T${time}:00Z`);
}

function clockFormat(locale: Locale): Intl.DateTimeFormat {
  return new Intl.DateTimeFormat(tags[locale], { hour: 'numeric', minute: '2-digit', timeZone: 'UTC' });
}

/** January 1, 2024 is a Monday. */
function weekday(day: number, locale: Locale): string {
  return new Intl.DateTimeFormat(tags[locale], { weekday: 'short', timeZone: 'UTC' }).format(
    new Date(`2024-01-0${day}T12:00:00Z`),
  );
}

/** No thin spaces around the dash, a plain one before am; in English am and pm are small. */
function plain(words: string, locale: Locale): string {
  const tight = words.replaceAll(/\s*–\s*/g, '–').replaceAll(/[\u00a0\u202f\u2009]/g, ' ');
  return locale === 'en' ? tight.replaceAll(/ (AM|PM)/g, (mark) => mark.toLowerCase()) : tight;
}
