import type { RuleCardContent } from './rule-card.content.js';
import type { RuleCardRow } from './rule-card-rows.js';
import type { RuleCardWords } from './rule-card-words.js';

/** The fields of a test whose value may come from a model code, with the row they stand in. */
export const sourcedFields = {
  acceptedMethods: 'accepted',
  headRule: 'level',
  pressures: 'pressure',
  standMinutes: 'stand',
  airOnPlastic: 'air',
  airRules: 'airRules',
  gaugeIncrements: 'gauge',
} as const;
export type SourcedField = keyof typeof sourcedFields;

/** Note 8: which values are a model code's, with its section; every other is local. */
export function sourcesNote(content: RuleCardContent): RuleCardRow[] {
  const entries = Object.entries(content.sources)
    .map(([path, source]) => ({ ...placeOf(content, path), source }))
    .sort((a, b) => (a.key < b.key ? -1 : 1));
  return [
    {
      key: 'sources',
      // by stage and system: a test keeps its source when it changes its place in the list
      value: entries.map(({ key, source }) => [key, source.from, source.section]),
      label: ({ t }) => t('rows.sources'),
      lines: (words) =>
        entries.length === 0
          ? [words.t('says.allLocal')]
          : entries.map(({ say, source }) => words.t('says.source', { what: say(words), ...source })),
    },
  ];
}

/** What a path of `sources` such as `tests.1.headRule` points to. */
function placeOf(content: RuleCardContent, path: string): { key: string; say: (words: RuleCardWords) => string } {
  const [part, index, field, ...rest] = path.split('.');
  const test = part === 'tests' ? content.tests[Number(index)] : undefined;
  if (test === undefined || field === undefined) return { key: path, say: () => path };
  const stage = content.stages.find(({ code }) => code === test.stageCode);
  const row = Object.hasOwn(sourcedFields, field) ? sourcedFields[field as SourcedField] : null;
  return {
    key: [test.stageCode, test.system, field, ...rest].join('.'),
    say: (words) =>
      words.t('says.ofTest', {
        system: words.t(`says.systems.${test.system}`),
        stage: stage === undefined ? test.stageCode : words.name(stage.name),
        what: row === null ? field : words.t(`rows.${row}`),
      }),
  };
}
