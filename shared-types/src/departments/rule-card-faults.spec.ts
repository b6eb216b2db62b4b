import { describe, expect, it } from 'vitest';
import type { RuleCardContent, TestRule } from './rule-card.content.js';
import { ruleCardContent } from './rule-card.content.js';
import { ruleCardFaults } from './rule-card-faults.js';
import { wholeRuleCard } from './testing/whole-rule-card.js';

const [dwv, water] = wholeRuleCard.tests as [TestRule, TestRule];
const faultsOf = (change: Partial<RuleCardContent>) => ruleCardFaults({ ...wholeRuleCard, ...change });
const asking = (change: Partial<RuleCardContent['asking']>) => ({ asking: { ...wholeRuleCard.asking, ...change } });

// issue "Rule cards", bad input, and interface §5: "overlapping dates, a window nobody works, by row"; the rest is what parts refer to
describe('faults that keep a draft from being published', () => {
  it('finds none in a whole rule card', () => {
    expect(ruleCardFaults(wholeRuleCard)).toEqual({});
  });

  it('finds a window on a day nobody works, and a re-inspection window that does not exist', () => {
    const [first] = wholeRuleCard.asking.windows;
    const windows = [{ ...first!, days: [6, 7] }];
    expect(faultsOf(asking({ windows, reinspectionWindows: ['early', 'dusk'] }))).toEqual({
      'asking.windows.0.days': 'nobody-works',
      'asking.reinspectionWindows.1': 'unknown',
    });
  });

  it('finds a test of no stage, a test given twice, and two stages in one place', () => {
    const stages = wholeRuleCard.stages.map((stage) => ({ ...stage, order: 1 }));
    expect(faultsOf({ stages, tests: [dwv, water, dwv, { ...dwv, stageCode: 'roof' }] })).toEqual({
      'stages.1.order': 'named-twice',
      'tests.2.system': 'named-twice',
      'tests.3.stageCode': 'unknown',
    });
  });

  it.each<[string, TestRule, Record<string, string>]>([
    ['water without a pressure', { ...water, pressures: [] }, { 'tests.0.pressures': 'required' }],
    ['air accepted without a pressure', { ...dwv, pressures: [] }, { 'tests.0.pressures': 'required' }],
    ['drains filled to no level', { ...dwv, headRule: null }, { 'tests.0.headRule': 'required' }],
    [
      'a head of zero',
      { ...dwv, headRule: { kind: 'above-highest-fitting', feet: 0 } },
      { 'tests.0.headRule.feet': 'must-be-positive' },
    ],
    [
      'a way of water lines for drains',
      { ...dwv, acceptedMethods: ['gauge'] },
      { 'tests.0.acceptedMethods': 'not-of-this-system' },
    ],
    [
      'a preferred pressure below the least',
      { ...water, pressures: [{ medium: 'water', minimumPsi: 100, preferredPsi: 90 }] },
      { 'tests.0.pressures.0.preferredPsi': 'below-minimum' },
    ],
  ])('finds %s', (_what, test, faults) => {
    expect(faultsOf({ tests: [test] })).toEqual(faults);
  });

  it('finds what is named twice', () => {
    const { fees, corrections } = wholeRuleCard;
    const twice = { ...corrections, sections: [...corrections.sections, ...corrections.sections] };
    expect(faultsOf({ fees: [...fees, ...fees], corrections: twice })).toEqual({
      'fees.1.event': 'named-twice',
      'corrections.sections.1.section': 'named-twice',
    });
  });
});

describe('the contract of a rule card', () => {
  const issueOf = (change: object) => {
    const parsed = ruleCardContent.safeParse({ ...wholeRuleCard, ...change });
    return parsed.success ? null : parsed.error.issues.map(({ path, message }) => [path.join('.'), message]);
  };

  it('refuses no accepted method, and ratings of zero, at their field', () => {
    expect(issueOf({ tests: [{ ...dwv, acceptedMethods: [] }, water] })).toEqual([
      ['tests.0.acceptedMethods', 'no-accepted-method'],
    ]);
    const zero = { ...water, pressures: [{ medium: 'water', minimumPsi: 0, preferredPsi: null }] };
    expect(issueOf({ tests: [dwv, { ...zero, airRules: { ...dwv.airRules, highestPsi: 0 } }] })).toEqual([
      ['tests.1.pressures.0.minimumPsi', 'must-be-positive'],
      ['tests.1.airRules.highestPsi', 'must-be-positive'],
    ]);
  });

  it('takes versions written before there were rules of their own for air', () => {
    const { airRules: _, ...before } = water;
    expect(issueOf({ tests: [dwv, before] })).toBeNull();
  });
});
