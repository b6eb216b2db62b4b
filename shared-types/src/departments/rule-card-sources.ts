import type { RuleCardContent, TestRule } from './rule-card.content.js';
import type { RuleCardDefault } from './rule-card-defaults.js';
import { sourcedFields, type SourcedField } from './rule-card-rows.sources.js';

type Sources = RuleCardContent['sources'];

/** The fields of a test that can come from a model code, in the order of the notes. */
export const sourcedFieldNames = Object.keys(sourcedFields) as SourcedField[];

/** Where a value of a test comes from; null: it is local. */
export function findSource(content: RuleCardContent, testIndex: number, field: SourcedField): Sources[string] | null {
  return content.sources[`tests.${testIndex}.${field}`] ?? null;
}

/** Takes over a model code's value, its section beside it. */
export function withDefault(content: RuleCardContent, testIndex: number, offered: RuleCardDefault): RuleCardContent {
  const { field, value, from, section } = offered;
  const taken = field === 'pressures' ? withPressures(content.tests[testIndex], value) : structuredClone(value);
  const changed = withTest(content, testIndex, { [field]: taken });
  return { ...changed, sources: { ...changed.sources, [`tests.${testIndex}.${field}`]: { from, section } } };
}

/** A code's pressure takes the place of that medium's; those of other media stay. */
function withPressures(test: TestRule | undefined, offered: RuleCardDefault['value']): TestRule['pressures'] {
  const pressures = offered as TestRule['pressures'];
  const kept = (test?.pressures ?? []).filter(({ medium }) => !pressures.some((each) => each.medium === medium));
  return [...kept, ...structuredClone(pressures)];
}

/** Changes a test; what the desk types of its own is local from then on. */
export function withTest(content: RuleCardContent, testIndex: number, change: Partial<TestRule>): RuleCardContent {
  const test = content.tests[testIndex];
  if (test === undefined) return content;
  const isTyped = (path: string) => Object.keys(change).some((field) => isUnder(path, `tests.${testIndex}.${field}`));
  return {
    ...content,
    tests: content.tests.with(testIndex, { ...test, ...change }),
    sources: keep(content.sources, (path) => (isTyped(path) ? null : path)),
  };
}

/** Takes out a test; the sources of those behind it move up with them. */
export function withoutTest(content: RuleCardContent, testIndex: number): RuleCardContent {
  return {
    ...content,
    tests: content.tests.filter((_, at) => at !== testIndex),
    sources: keep(content.sources, (path) => {
      const [part, at, ...rest] = path.split('.');
      const index = Number(at);
      if (part !== 'tests' || index < testIndex) return path;
      return index === testIndex ? null : ['tests', index - 1, ...rest].join('.');
    }),
  };
}

/** How many values that could come from a model code are local, and how many do. */
export function countSources(content: RuleCardContent): { local: number; fromModelCode: number } {
  const paths = content.tests.flatMap((_, index) =>
    sourcedFieldNames.map((field) => findSource(content, index, field)),
  );
  const fromModelCode = paths.filter((source) => source !== null && source.from !== 'local').length;
  return { local: paths.length - fromModelCode, fromModelCode };
}

function isUnder(path: string, parent: string): boolean {
  return path === parent || path.startsWith(`${parent}.`);
}

function keep(sources: Sources, move: (path: string) => string | null): Sources {
  return Object.fromEntries(
    Object.entries(sources).flatMap(([path, source]) => {
      const moved = move(path);
      return moved === null ? [] : [[moved, source]];
    }),
  );
}
