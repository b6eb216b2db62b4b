import type { Locale } from '@holdwater/shared-types/common/locale.js';

/** The reader's locale for Intl, as everywhere: the trade is in the States. */
const tags: Record<Locale, string> = { en: 'en-US', es: 'es-US' };

/** "6:45:40 am": shut and opened readings follow each other within a minute. */
export function secondClock(at: string, zone: string, locale: Locale): string {
  const words = new Intl.DateTimeFormat(tags[locale], { timeZone: zone, timeStyle: 'medium' }).format(new Date(at));
  const plain = words.replace(/[\u00a0\u202f\u2009]/g, ' ');
  return locale === 'en' ? plain.replace(/ (AM|PM)/, (mark) => mark.toLowerCase()) : plain;
}
