import type { BackendModule, ResourceKey } from 'i18next';

type LocaleFile = () => Promise<ResourceKey>;

/** Every phrase file, loaded when its namespace is first used: `locales/<language>/<namespace>.json`. */
const files = import.meta.glob<ResourceKey>('../locales/*/*.json', { import: 'default' });

export function findLocaleFile(language: string, namespace: string): LocaleFile | null {
  return files[`../locales/${language}/${namespace}.json`] ?? null;
}

/** The namespaces there are, by their English files. */
export function listNamespaces(): string[] {
  return Object.keys(files).flatMap((path) => /\/en\/(.+)\.json$/.exec(path)?.[1] ?? []);
}

/** Loads phrase files for i18next. A namespace without a file is an error of ours and is told as one. */
export const localeFiles: BackendModule = {
  type: 'backend',
  init: () => undefined,
  read: (language, namespace, done) => {
    const file = findLocaleFile(language, namespace);
    if (file === null) {
      done(new Error(`no phrases: ${language}/${namespace}`), false);
      return;
    }
    file().then(
      (phrases) => done(null, phrases),
      (error: unknown) => done(error instanceof Error ? error : new Error(String(error)), true),
    );
  },
};
