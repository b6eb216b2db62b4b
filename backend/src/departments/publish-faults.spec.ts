import { describe, expect, it } from 'vitest';
import { askingFixture, ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { publishFaults } from './publish-faults.js';
import { starterRuleCard } from './starter-rule-card.js';

// interface §5 Rule card: "Error: overlapping dates, a window nobody works, by row"; the rest is what the parts refer to
describe('faults that keep a draft from being published', () => {
  it('finds none in a whole rule card, nor in the one a department starts from', () => {
    expect(publishFaults(ruleCardContent())).toEqual({});
    expect(publishFaults(starterRuleCard)).toEqual({});
  });

  it('finds a window on a day nobody works, and a re-inspection window that does not exist', () => {
    const [first] = askingFixture.windows;
    const asking = { ...askingFixture, windows: [{ ...first!, days: [6, 7] }], reinspectionWindows: ['early', 'dusk'] };
    expect(publishFaults(ruleCardContent({ asking }))).toEqual({
      'asking.windows.0.days': 'nobody-works',
      'asking.reinspectionWindows.1': 'unknown',
    });
  });

  it('finds a test of no stage, a test given twice, water without a pressure and two stages in one place', () => {
    const { stages, tests } = ruleCardContent();
    const [dwv, , water] = tests;
    const content = ruleCardContent({
      stages: stages.map((stage) => ({ ...stage, order: 1 })),
      tests: [...tests, dwv!, { ...dwv!, stageCode: 'roof' }, { ...water!, stageCode: 'groundwork', pressures: [] }],
    });
    expect(publishFaults(content)).toEqual({
      'stages.1.order': 'named-twice',
      'stages.2.order': 'named-twice',
      'tests.3.system': 'named-twice',
      'tests.4.stageCode': 'unknown',
      'tests.5.pressures': 'required',
    });
  });
});
