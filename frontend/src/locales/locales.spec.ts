import { errorCodes } from '@holdwater/shared-types/errors/catalogue.js';
import { memberRoles, organizationKinds } from '@holdwater/shared-types/accounts/roles.js';
import { noticeKinds } from '@holdwater/shared-types/notices/notice.contract.js';
import { outcomeKinds } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { waitingKinds } from '@holdwater/shared-types/visits/calendar.contract.js';
import { visitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { describe, expect, it } from 'vitest';
import { pageFaults } from '../lib/api-error';
import { listNamespaces } from '../lib/locale-files';

type Phrases = { [key: string]: string | Phrases };
const files = import.meta.glob<Phrases>('./*/*.json', { eager: true, import: 'default' });
const namespaces = listNamespaces();

function phrasesOf(language: 'en' | 'es', namespace: string): Phrases {
  const phrases = files[`./${language}/${namespace}.json`];
  if (phrases === undefined) throw new Error(`no ${language}/${namespace}.json`);
  return phrases;
}

function leavesOf(phrases: Phrases, path = ''): [string, string][] {
  return Object.entries(phrases).flatMap(([key, value]) =>
    typeof value === 'string' ? [[`${path}${key}`, value] as [string, string]] : leavesOf(value, `${path}${key}.`),
  );
}

/** Both languages count in their own plural forms (Unicode CLDR); the phrase is the same. */
const withoutPlural = (key: string): string => key.replace(/_(one|many|other)$/, '');

const namesIn = (phrase: string): string[] => [...phrase.matchAll(/{{(\w+)}}/g)].map(([, name]) => name ?? '').sort();

/** Names used by any form of a phrase; "one" may say the number itself. */
function namesByKey(language: 'en' | 'es', namespace: string): Map<string, Set<string>> {
  const names = new Map<string, Set<string>>();
  for (const [key, phrase] of leavesOf(phrasesOf(language, namespace))) {
    const known = names.get(withoutPlural(key)) ?? new Set<string>();
    namesIn(phrase).forEach((name) => known.add(name));
    names.set(withoutPlural(key), known);
  }
  return names;
}

describe.each(namespaces)('%s', (namespace) => {
  it('has the same phrases in English and Spanish, with the same values in them', () => {
    expect(Object.fromEntries(namesByKey('es', namespace))).toEqual(Object.fromEntries(namesByKey('en', namespace)));
  });

  it('has no empty phrase', () => {
    const leaves = [...leavesOf(phrasesOf('en', namespace)), ...leavesOf(phrasesOf('es', namespace))];
    expect(leaves.filter(([, phrase]) => phrase.trim() === '')).toEqual([]);
  });

  it('has no top-level key that is a namespace: it would never be found', () => {
    const tops = new Set([...Object.keys(phrasesOf('en', namespace)), ...Object.keys(phrasesOf('es', namespace))]);
    expect(namespaces.filter((name) => tops.has(name))).toEqual([]);
  });

  it('keeps to the words of the interface guide, section 9', () => {
    // No exclamation marks, no "oops", no "please wait"; always "floor" and "email".
    const forbidden = /[!¡]|oops|please wait|\bstorey\b|\be-mail\b/i;
    expect(leavesOf(phrasesOf('en', namespace)).filter(([, phrase]) => forbidden.test(phrase))).toEqual([]);
    expect(leavesOf(phrasesOf('es', namespace)).filter(([, phrase]) => /[!¡]/.test(phrase))).toEqual([]);
  });
});

describe('codes have words in both languages', () => {
  const has = (namespace: string, path: string): boolean =>
    (['en', 'es'] as const).every((language) =>
      leavesOf(phrasesOf(language, namespace)).some(([key]) => withoutPlural(key) === path),
    );
  const missing = (namespace: string, paths: readonly string[]): string[] =>
    paths.filter((path) => !has(namespace, path));

  it('errors: what happened, what is safe, what to do next', () => {
    const paths = [...errorCodes, ...pageFaults].flatMap((code) => [`${code}.title`, `${code}.safe`, `${code}.next`]);
    expect(missing('errors', paths)).toEqual([]);
  });

  it('notices', () => {
    const leaves = leavesOf(phrasesOf('en', 'notices')).map(([key]) => key);
    const bare = noticeKinds.filter(
      (kind) => !leaves.some((key) => key === `kinds.${kind}` || key.startsWith(`kinds.${kind}.`)),
    );
    expect(bare).toEqual([]);
  });

  it('visit states and outcomes', () => {
    const states = visitStates.filter((state) => state !== 'closed');
    expect(missing('marks', [...states, ...outcomeKinds])).toEqual([]);
  });

  it('roles, kinds of organization, kinds of waiting', () => {
    expect(
      missing(
        'common',
        [...memberRoles, 'operator'].map((role) => `roles.${role}`),
      ),
    ).toEqual([]);
    expect(
      missing(
        'common',
        organizationKinds.map((kind) => `kinds.${kind}`),
      ),
    ).toEqual([]);
    expect(
      missing(
        'app',
        waitingKinds.flatMap((kind) => ['kinds', 'theirs', 'titles'].map((words) => `waiting.${words}.${kind}`)),
      ),
    ).toEqual([]);
  });
});
