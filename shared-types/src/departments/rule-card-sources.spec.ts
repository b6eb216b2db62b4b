import { describe, expect, it } from 'vitest';
import { offeredDefaults, ruleCardDefaults } from './rule-card-defaults.js';
import { testRule } from './rule-card.content.js';
import { countSources, findSource, withDefault, withoutTest, withTest } from './rule-card-sources.js';
import { wholeRuleCard } from './testing/whole-rule-card.js';

const [dwv, water] = wholeRuleCard.tests;

describe('values of the model codes', () => {
  it.each(
    ruleCardDefaults.map((each) => [`${each.from} ${each.section}, ${each.system} ${each.field}`, each] as const),
  )('of %s are what a test may hold, and name their section', (_name, offered) => {
    const test = offered.system === 'dwv' ? dwv : water;
    expect(testRule.safeParse({ ...test, [offered.field]: offered.value }).success).toBe(true);
    expect(offered.section).toMatch(/\d/);
  });

  it('are those of the published texts', () => {
    // IRC P2503.5.1: 10 ft in the editions to 2009, 5 ft in that of 2018; IRC P2503.7: 50 psi of air where the pipe is not plastic
    expect(offeredDefaults(dwv!, 'headRule').map(({ value, from }) => [from, value])).toEqual([
      ['IRC 2018', { kind: 'above-highest-fitting', feet: 5 }],
      ['IRC 2009', { kind: 'above-highest-fitting', feet: 10 }],
      ['IPC', { kind: 'fill-level', feet: null }],
    ]);
    const air = offeredDefaults(water!, 'pressures').find(({ value }) => JSON.stringify(value).includes('air'));
    expect(air?.value).toEqual([{ medium: 'air', minimumPsi: 50, preferredPsi: null }]);
  });

  it('offer an air pressure for drains only where air is accepted', () => {
    expect(offeredDefaults({ ...dwv!, acceptedMethods: ['attic-cut'] }, 'pressures')).toEqual([]);
    expect(offeredDefaults(dwv!, 'pressures')).toHaveLength(1);
  });
});

describe('where a value comes from', () => {
  it('is the code and section taken over, and local once the desk types its own', () => {
    const [offered] = offeredDefaults(water!, 'standMinutes');
    const taken = withDefault(wholeRuleCard, 1, offered!);
    expect(findSource(taken, 1, 'standMinutes')).toEqual({ from: 'IRC', section: 'P2503.7' });
    expect(countSources(taken)).toEqual({ local: 12, fromModelCode: 2 });
    expect(findSource(withTest(taken, 1, { standMinutes: 20 }), 1, 'standMinutes')).toBeNull();
    expect(findSource(withTest(taken, 1, { standMinutes: 20 }), 0, 'headRule')).not.toBeNull();
  });

  it('takes over the pressure of its medium alone', () => {
    const air = offeredDefaults(water!, 'pressures').find(({ section }) => section === 'P2503.7');
    expect(withDefault(wholeRuleCard, 1, air!).tests[1]?.pressures).toEqual([
      ...water!.pressures,
      { medium: 'air', minimumPsi: 50, preferredPsi: null },
    ]);
  });

  it('stays with its test when one before it goes', () => {
    const [offered] = offeredDefaults(water!, 'standMinutes');
    const fewer = withoutTest(withDefault(wholeRuleCard, 1, offered!), 0);
    expect(Object.keys(fewer.sources)).toEqual(['tests.0.standMinutes']);
  });
});
