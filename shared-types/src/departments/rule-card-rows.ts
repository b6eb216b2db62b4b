import type { RuleCardContent, TestRule } from './rule-card.content.js';
import { correctionsNote, feesNote, testUpNote, workNote } from './rule-card-rows.visit.js';
import { testNote } from './rule-card-rows.system.js';
import { sourcesNote } from './rule-card-rows.sources.js';
import { windowsNote } from './rule-card-rows.windows.js';
import type { RuleCardWords } from './rule-card-words.js';

/** One line of a rule card: what it stands for, and how it is said. Every field of the content stands in exactly one row. */
export interface RuleCardRow {
  readonly key: string;
  /** Plain data; two rows of one key say the same when it is equal. */
  readonly value: unknown;
  readonly label: (words: RuleCardWords) => string;
  readonly lines: (words: RuleCardWords) => string[];
  /** Said only where it changes: of no use to whoever reads what to do, such as the mark of a gauge in a test that has none. */
  readonly isQuiet?: boolean;
  /** Says that there is nothing, where other rows would stand. */
  readonly isFiller?: boolean;
}

export const noteKeys = ['windows', 'dwv', 'water', 'testUp', 'work', 'fees', 'corrections', 'sources'] as const;
export type NoteKey = (typeof noteKeys)[number];

/** A numbered note of a rule card; its number is its place. */
export interface RuleCardNote {
  readonly key: NoteKey;
  readonly rows: readonly RuleCardRow[];
}

/** The notes that differ from stage to stage; the others are the department's for every stage. */
const ofStage: ReadonlySet<NoteKey> = new Set(['dwv', 'water', 'work']);

export function isNoteOfStage(key: NoteKey): boolean {
  return ofStage.has(key);
}

/** What a rule card says of one stage, in the notes every rule card has. */
export function ruleCardNotes(content: RuleCardContent, stageCode: string): RuleCardNote[] {
  return [
    { key: 'windows', rows: windowsNote(content.asking) },
    { key: 'dwv', rows: testNote(findTest(content, stageCode, 'dwv'), 'dwv') },
    { key: 'water', rows: testNote(findTest(content, stageCode, 'water'), 'water') },
    { key: 'testUp', rows: testUpNote(content) },
    { key: 'work', rows: workNote(content.stages.find(({ code }) => code === stageCode)) },
    { key: 'fees', rows: feesNote(content) },
    { key: 'corrections', rows: correctionsNote(content.corrections) },
    { key: 'sources', rows: sourcesNote(content) },
  ];
}

/** Codes of the stages in the department's order. */
export function stageCodesInOrder({ stages }: Pick<RuleCardContent, 'stages'>): string[] {
  return [...stages].sort((a, b) => a.order - b.order).map(({ code }) => code);
}

function findTest({ tests }: RuleCardContent, stageCode: string, system: TestRule['system']): TestRule | undefined {
  return tests.find((test) => test.stageCode === stageCode && test.system === system);
}
