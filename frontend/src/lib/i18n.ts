import { locales, type Locale } from '@holdwater/shared-types/common/locale.js';
import i18next from 'i18next';
import { initReactI18next, useTranslation } from 'react-i18next';
import { localeFiles } from './locale-files';

const storageKey = 'holdwater.language';

function isLocale(value: unknown): value is Locale {
  return locales.some((one) => one === value);
}

/** The language kept on this device, else the first of the browser's that we speak, else English. */
export function preferredLocale(): Locale {
  const kept = readKept();
  if (kept !== null) return kept;
  const spoken = navigator.languages.map((language) => language.slice(0, 2).toLowerCase());
  return spoken.find(isLocale) ?? 'en';
}

function readKept(): Locale | null {
  try {
    const kept = window.localStorage.getItem(storageKey);
    return isLocale(kept) ? kept : null;
  } catch {
    return null;
  }
}

/** Starts the phrases; other namespaces load with the pages that name them. */
export async function startI18n(locale: Locale = preferredLocale()): Promise<void> {
  document.documentElement.lang = locale;
  await i18next
    .use(localeFiles)
    .use(initReactI18next)
    .init({
      lng: locale,
      fallbackLng: 'en',
      supportedLngs: [...locales],
      ns: ['common', 'errors', 'marks'],
      defaultNS: 'common',
      // `t('marks.ready')` reaches another namespace; inside its own, `t('title')` does. No phrase file may have a top-level key that is
      // itself a namespace's name (locales.spec.ts).
      keySeparator: '.',
      nsSeparator: '.',
      // React escapes what it prints.
      interpolation: { escapeValue: false },
      returnNull: false,
      react: { useSuspense: true },
    });
}

/** Changes the language of the page and keeps it on this device. Keeping it on the person is `useSession().changeLocale`. */
export async function changeLanguage(locale: Locale): Promise<void> {
  try {
    window.localStorage.setItem(storageKey, locale);
  } catch {
    // Storage may be blocked: the language then lasts as long as the page.
  }
  document.documentElement.lang = locale;
  await i18next.changeLanguage(locale);
}

/** The language the page is in. */
export function useLocale(): Locale {
  const { i18n } = useTranslation();
  return isLocale(i18n.resolvedLanguage) ? i18n.resolvedLanguage : 'en';
}

/** A name of the rule card's in the reader's language, English where it has none. */
export function localName(name: { en: string; es?: string }, locale: Locale): string {
  return (locale === 'es' ? name.es : undefined) ?? name.en;
}
