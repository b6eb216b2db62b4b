import { waterMethods } from '../holds/hold.states.js';
import type { RuleCardContent, TestRule } from './rule-card.content.js';

type Faults = Record<string, string>;

/**
 * What keeps a draft, valid in each of its parts, from being published: parts that do not fit together, and ratings of zero. By path, as the
 * fields of an error. Whoever edits may save them half done; whoever books by them may not find them so. Page and server ask the same.
 */
export function ruleCardFaults(content: RuleCardContent): Faults {
  return { ...stageFaults(content), ...testFaults(content), ...windowFaults(content), ...otherFaults(content) };
}

function stageFaults({ stages }: RuleCardContent): Faults {
  const faults: Faults = {};
  stages.forEach((stage, s) => {
    if (stages.findIndex(({ order }) => order === stage.order) !== s) faults[`stages.${s}.order`] = 'named-twice';
    twice(
      stage.work,
      ({ code }) => code,
      (w) => (faults[`stages.${s}.work.${w}.code`] = 'named-twice'),
    );
  });
  return faults;
}

function testFaults({ stages, tests }: RuleCardContent): Faults {
  const faults: Faults = {};
  tests.forEach((test, t) => {
    if (!stages.some(({ code }) => code === test.stageCode)) faults[`tests.${t}.stageCode`] = 'unknown';
    const first = tests.findIndex(({ stageCode, system }) => stageCode === test.stageCode && system === test.system);
    if (first !== t) faults[`tests.${t}.system`] = 'named-twice';
    for (const [path, fault] of Object.entries(faultsOfTest(test))) faults[`tests.${t}.${path}`] = fault;
  });
  return faults;
}

function faultsOfTest(test: TestRule): Faults {
  const { system, acceptedMethods, pressures, headRule } = test;
  const faults: Faults = {};
  const isWater = system === 'water';
  const isOfWater = (method: string) => waterMethods.some((each) => each === method);
  if (acceptedMethods.some((method) => isOfWater(method) !== isWater)) faults.acceptedMethods = 'not-of-this-system';
  const isAirAsked = acceptedMethods.includes('air');
  if ((isWater || isAirAsked) && pressures.length === 0) faults.pressures = 'required';
  const isFilled = !isWater && acceptedMethods.some((method) => method !== 'air');
  if (isFilled && headRule === null) faults.headRule = 'required';
  if (headRule?.kind === 'above-highest-fitting' && !headRule.feet) faults['headRule.feet'] = 'must-be-positive';
  twice(
    pressures,
    ({ medium }) => medium,
    (p) => (faults[`pressures.${p}.medium`] = 'named-twice'),
  );
  pressures.forEach(({ minimumPsi, preferredPsi }, p) => {
    if (preferredPsi !== null && preferredPsi < minimumPsi) faults[`pressures.${p}.preferredPsi`] = 'below-minimum';
  });
  return faults;
}

function windowFaults({ asking: { windows, workingDays, reinspectionWindows } }: RuleCardContent): Faults {
  const faults: Faults = {};
  windows.forEach(({ days }, w) => {
    if (days.length > 0 && !days.some((day) => workingDays.includes(day)))
      faults[`asking.windows.${w}.days`] = 'nobody-works';
  });
  (reinspectionWindows ?? []).forEach((label, r) => {
    if (!windows.some((window) => window.label === label)) faults[`asking.reinspectionWindows.${r}`] = 'unknown';
  });
  return faults;
}

function otherFaults({ fees, corrections }: RuleCardContent): Faults {
  const faults: Faults = {};
  twice(
    fees,
    ({ event }) => event,
    (f) => (faults[`fees.${f}.event`] = 'named-twice'),
  );
  const named = (list: 'frequent' | 'sections', part: string) => (at: number) =>
    (faults[`corrections.${list}.${at}.${part}`] = 'named-twice');
  twice(corrections.frequent, ({ code }) => code, named('frequent', 'code'));
  twice(corrections.sections, ({ section }) => section, named('sections', 'section'));
  return faults;
}

/** Tells the place of every item whose key came before. */
function twice<Item>(items: readonly Item[], keyOf: (item: Item) => string, found: (at: number) => void): void {
  const keys = items.map(keyOf);
  keys.forEach((key, at) => {
    if (keys.indexOf(key) !== at) found(at);
  });
}
