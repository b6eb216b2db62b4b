import { locales, type Locale } from '../common/locale.js';
import type { RuleCardContent } from './rule-card.content.js';
import { isNoteOfStage, type NoteKey, type RuleCardRow, ruleCardNotes, stageCodesInOrder } from './rule-card-rows.js';
import { type OwnWords, type RuleCardWords, ruleCardWords } from './rule-card-words.js';

/** The lines of a row in every language. */
export type LinesByLocale = Readonly<Record<Locale, readonly string[]>>;

/** One row that says something else in the later version. */
export interface RuleCardChange {
  readonly note: NoteKey;
  readonly row: string;
  /** Null: it holds for every stage. */
  readonly stageCode: string | null;
  readonly stageName: OwnWords | null;
  readonly noteTitle: Readonly<Record<Locale, string>>;
  readonly label: Readonly<Record<Locale, string>>;
  /** Null: the version before does not say anything here. */
  readonly before: LinesByLocale | null;
  /** Null: the later version says nothing here any more. */
  readonly after: LinesByLocale | null;
}

/**
 * What differs between two versions, each row once, in the order of the notes: first what holds for every stage, then stage by stage. What is
 * a set (weekdays, methods, roles) is compared as one; all else in its order.
 */
export function compareRuleCards(before: RuleCardContent, after: RuleCardContent): RuleCardChange[] {
  const stageCodes = [...new Set([after, before].flatMap(allStageCodes))];
  const [anyStage = ''] = stageCodes;
  const common = comparePart(before, after, anyStage, false);
  return [...common, ...stageCodes.flatMap((stageCode) => comparePart(before, after, stageCode, true))];
}

/** In the department's order; last those that only a test names. */
function allStageCodes(content: RuleCardContent): string[] {
  return [...stageCodesInOrder(content), ...content.tests.map(({ stageCode }) => stageCode)];
}

/** The changes that concern whoever has to do with these stages. */
export function changesForStages(changes: readonly RuleCardChange[], stageCodes: readonly string[]): RuleCardChange[] {
  return changes.filter(({ stageCode }) => stageCode === null || stageCodes.includes(stageCode));
}

/** "Rough-in, Water, Pressure: 60 psi with air (before: 50 psi with air)". */
export function changeSentence(change: RuleCardChange, locale: Locale): string {
  const { t, name } = ruleCardWords(locale);
  const place = { note: change.noteTitle[locale], row: change.label[locale] };
  const where =
    change.stageName === null
      ? t('sentence.place', place)
      : t('sentence.placeAt', { ...place, stage: name(change.stageName) });
  const [before, after] = [change.before, change.after].map((lines) => lines?.[locale].join('; ') ?? '');
  const kind = change.before === null ? 'added' : change.after === null ? 'gone' : 'changed';
  return t(`sentence.${kind}`, { where, before: before ?? '', after: after ?? '' });
}

function comparePart(
  before: RuleCardContent,
  after: RuleCardContent,
  stageCode: string,
  isOfStage: boolean,
): RuleCardChange[] {
  const stage = [after, before].flatMap(({ stages }) => stages).find(({ code }) => code === stageCode);
  const [old, now] = [before, after].map((content) =>
    ruleCardNotes(content, stageCode).filter(({ key }) => isNoteOfStage(key) === isOfStage),
  );
  return (now ?? []).flatMap(({ key: note, rows }) => {
    const oldRows = old?.find(({ key }) => key === note)?.rows ?? [];
    return rowKeys(rows, oldRows).flatMap((row) => {
      const [was, is] = [findRow(oldRows, row), findRow(rows, row)];
      if (!isTold(was, is)) return [];
      const place = { stageCode: isOfStage ? stageCode : null, stageName: isOfStage ? (stage?.name ?? null) : null };
      return [{ note, row, ...place, ...changeWords(note, was, is) }];
    });
  });
}

function isTold(was: RuleCardRow | undefined, is: RuleCardRow | undefined): boolean {
  if (was !== undefined && is !== undefined) return !isSame(was.value, is.value);
  const only = is ?? was;
  return only !== undefined && !only.isQuiet && !only.isFiller;
}

function rowKeys(rows: readonly RuleCardRow[], oldRows: readonly RuleCardRow[]): string[] {
  return [...new Set([...rows, ...oldRows].map(({ key }) => key))];
}

function findRow(rows: readonly RuleCardRow[], row: string): RuleCardRow | undefined {
  return rows.find(({ key }) => key === row);
}

function changeWords(
  note: NoteKey,
  was: RuleCardRow | undefined,
  is: RuleCardRow | undefined,
): Pick<RuleCardChange, 'noteTitle' | 'label' | 'before' | 'after'> {
  // where the plain words do not tell the two apart (a code, the other language's name), they are told in full
  const isExact = was !== undefined && is !== undefined && locales.some((locale) => readsSame(was, is, locale));
  const all = <Value>(say: (words: RuleCardWords) => Value): Record<Locale, Value> => ({
    en: say(ruleCardWords('en', isExact)),
    es: say(ruleCardWords('es', isExact)),
  });
  return {
    noteTitle: all(({ t }) => t(`notes.${note}`)),
    label: all((words) => (is ?? was)?.label(words) ?? ''),
    before: was === undefined ? null : all((words) => was.lines(words)),
    after: is === undefined ? null : all((words) => is.lines(words)),
  };
}

function readsSame(was: RuleCardRow, is: RuleCardRow, locale: Locale): boolean {
  const words = ruleCardWords(locale);
  return isSame(was.lines(words), is.lines(words));
}

/** Equal as plain data, whatever the order of keys; JSON stores none. */
function isSame(one: unknown, other: unknown): boolean {
  return canonical(one) === canonical(other);
}

function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, part: unknown) =>
    typeof part === 'object' && part !== null && !Array.isArray(part)
      ? Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : 1)))
      : part,
  );
}
