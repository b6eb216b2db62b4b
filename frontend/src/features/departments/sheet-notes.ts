import { compareRuleCards, type RuleCardChange } from '@holdwater/shared-types/departments/compare-rule-cards.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { isNoteOfStage, type NoteKey, ruleCardNotes } from '@holdwater/shared-types/departments/rule-card-rows.js';
import type { RuleCardWords } from '@holdwater/shared-types/departments/rule-card-words.js';

/** A row of the sheet: what this version says, and what the one beside it says. */
export interface SheetRow {
  readonly key: string;
  readonly label: string;
  /** Null: it says nothing here. */
  readonly lines: readonly string[] | null;
  readonly before: readonly string[] | null;
  readonly isChanged: boolean;
}

/** A numbered note; its number is its place. */
export interface SheetNote {
  readonly key: NoteKey;
  readonly title: string;
  readonly rows: readonly SheetRow[];
}

/** What a version says of one stage, in words; beside another where one is given. */
export function sheetNotes(
  content: RuleCardContent,
  against: RuleCardContent | null,
  stageCode: string,
  words: RuleCardWords,
): SheetNote[] {
  const changes = against === null ? [] : compareRuleCards(against, content);
  return ruleCardNotes(content, stageCode).map(({ key: note, rows }) => {
    const ofNote = changes.filter((change) => change.note === note && isOfStage(change, stageCode));
    const standing = rows.flatMap((row) => {
      const change = ofNote.find((each) => each.row === row.key);
      if (change !== undefined) return [changedRow(change, words)];
      if (row.isQuiet) return [];
      const lines = row.lines(words);
      return [{ key: row.key, label: row.label(words), lines, before: lines, isChanged: false }];
    });
    const gone = ofNote.filter(({ row }) => !rows.some(({ key }) => key === row));
    return {
      key: note,
      title: words.t(`notes.${note}`),
      rows: [...standing, ...gone.map((change) => changedRow(change, words))],
    };
  });
}

/** Changed rows of the sheet, of all of them. */
export function countRows(notes: readonly SheetNote[]): { changed: number; all: number } {
  const rows = notes.flatMap((note) => note.rows);
  return { changed: rows.filter(({ isChanged }) => isChanged).length, all: rows.length };
}

/** Only what differs; notes in which nothing does are left out, the others keep their number. */
export function changedOnly(notes: readonly SheetNote[]): SheetNote[] {
  return notes.map((note) => ({ ...note, rows: note.rows.filter(({ isChanged }) => isChanged) }));
}

function isOfStage({ stageCode, note }: RuleCardChange, chosen: string): boolean {
  return isNoteOfStage(note) ? stageCode === chosen : stageCode === null;
}

function changedRow({ row, label, before, after }: RuleCardChange, { locale }: RuleCardWords): SheetRow {
  return {
    key: row,
    label: label[locale],
    lines: after?.[locale] ?? null,
    before: before?.[locale] ?? null,
    isChanged: true,
  };
}
