import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';

/**
 * What keeps a draft, valid in each of its parts, from being published: parts that do not fit together. By path, as the fields of an error.
 * Whoever edits may save them half done; whoever books by them may not find them so.
 */
export function publishFaults(content: RuleCardContent): Record<string, string> {
  return { ...stageFaults(content), ...testFaults(content), ...windowFaults(content) };
}

function stageFaults({ stages }: RuleCardContent): Record<string, string> {
  const faults: Record<string, string> = {};
  stages.forEach((stage, s) => {
    if (stages.findIndex(({ order }) => order === stage.order) !== s) faults[`stages.${s}.order`] = 'named-twice';
  });
  return faults;
}

function testFaults({ stages, tests }: RuleCardContent): Record<string, string> {
  const faults: Record<string, string> = {};
  tests.forEach((test, t) => {
    if (!stages.some(({ code }) => code === test.stageCode)) faults[`tests.${t}.stageCode`] = 'unknown';
    const first = tests.findIndex(({ stageCode, system }) => stageCode === test.stageCode && system === test.system);
    if (first !== t) faults[`tests.${t}.system`] = 'named-twice';
    if (test.system === 'water' && test.pressures.length === 0) faults[`tests.${t}.pressures`] = 'required';
  });
  return faults;
}

function windowFaults({
  asking: { windows, workingDays, reinspectionWindows },
}: RuleCardContent): Record<string, string> {
  const faults: Record<string, string> = {};
  windows.forEach(({ days }, w) => {
    if (days.length > 0 && !days.some((day) => workingDays.includes(day)))
      faults[`asking.windows.${w}.days`] = 'nobody-works';
  });
  (reinspectionWindows ?? []).forEach((label, r) => {
    if (!windows.some((window) => window.label === label)) faults[`asking.reinspectionWindows.${r}`] = 'unknown';
  });
  return faults;
}
