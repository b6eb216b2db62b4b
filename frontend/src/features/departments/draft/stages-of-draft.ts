import type { RuleCardContent, Stage, TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import { withoutTest } from '@holdwater/shared-types/departments/rule-card-sources.js';
import { freshCode } from './fresh-code';

type System = TestRule['system'];

/** What a test begins with when a stage asks for a system it did not test before: nothing a department has not said itself. */
function freshTest(stageCode: string, system: System): TestRule {
  const isWater = system === 'water';
  return {
    ...{ stageCode, system, acceptedMethods: isWater ? ['gauge'] : [], headRule: null },
    ...{ pressures: [], measuredAt: 'gauge', standMinutes: null, airOnPlastic: false, settleMinutes: 0 },
    ...{ gaugeIncrements: [], mayStayIsolated: [], levelSeenFrom: [] },
    photoWanted: { reading: false, fix: false, takeDown: false },
  };
}

/** Changes a stage; its tests follow its code and the systems it asks for. */
export function withStage(content: RuleCardContent, index: number, next: Stage): RuleCardContent {
  const before = content.stages[index];
  if (before === undefined) return content;
  const renamed: RuleCardContent = {
    ...content,
    stages: content.stages.with(index, next),
    tests: content.tests.map((test) => (test.stageCode === before.code ? { ...test, stageCode: next.code } : test)),
  };
  const gone = before.systems.filter((system) => !next.systems.includes(system));
  const come = next.systems.filter((system) => findTestIndex(renamed, next.code, system) < 0);
  const fewer = gone.reduce((each, system) => withoutTestOf(each, next.code, system), renamed);
  return { ...fewer, tests: [...fewer.tests, ...come.map((system) => freshTest(next.code, system))] };
}

export function withNewStage(content: RuleCardContent): RuleCardContent {
  const order = Math.max(0, ...content.stages.map((stage) => stage.order)) + 1;
  const stage: Stage = {
    ...{ code: freshCode(content.stages), name: { en: '' }, inspectionCode: '', order, systems: [] },
    ...{ covers: null, minutesPerVisit: 30, work: [] },
  };
  return { ...content, stages: [...content.stages, stage] };
}

/** Takes out a stage with its tests. */
export function withoutStage(content: RuleCardContent, index: number): RuleCardContent {
  const stage = content.stages[index];
  if (stage === undefined) return content;
  const fewer = (['dwv', 'water'] as const).reduce((each, system) => withoutTestOf(each, stage.code, system), content);
  return { ...fewer, stages: fewer.stages.filter((_, at) => at !== index) };
}

export function findTestIndex({ tests }: RuleCardContent, stageCode: string, system: System): number {
  return tests.findIndex((test) => test.stageCode === stageCode && test.system === system);
}

function withoutTestOf(content: RuleCardContent, stageCode: string, system: System): RuleCardContent {
  const index = findTestIndex(content, stageCode, system);
  return index < 0 ? content : withoutTest(content, index);
}
