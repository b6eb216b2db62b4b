import { describe, expect, it } from 'vitest';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { findUnfitReason } from './unfit-plan.rules.js';

const by = ruleCardContent();
const underTest = (change: Partial<TestRule>, system: TestRule['system']) =>
  ruleCardContent({ tests: by.tests.map((test) => (test.system === system ? { ...test, ...change } : test)) });
const cut = { stageCode: 'rough-in', system: 'dwv', method: 'attic-cut', medium: 'water' } as const;
const topped = { ...cut, system: 'water', method: 'gauge', medium: 'water-topped-with-air' } as const;

// mockup H: "4 plans use air under 60 psi. Their plumbers are told to choose again."
describe('plans a new version does not take', () => {
  it('takes a plan whose method, level and pressure stay', () => {
    expect(findUnfitReason(cut, by, underTest({ standMinutes: 60 }, 'dwv'))).toBeNull();
    expect(findUnfitReason(topped, by, by)).toBeNull();
  });

  it.each<[string, typeof cut | typeof topped, Partial<TestRule>, string]>([
    ['method', cut, { acceptedMethods: ['standpipe'] }, 'a method that is not accepted any more'],
    ['level', cut, { headRule: { kind: 'above-highest-fitting', feet: 10 } }, 'another level'],
    ['medium', topped, { pressures: [{ medium: 'water', minimumPsi: 100, preferredPsi: null }] }, 'no air any more'],
    [
      'pressure',
      topped,
      { pressures: [{ medium: 'water-topped-with-air', minimumPsi: 110, preferredPsi: null }] },
      'more pressure',
    ],
  ])('says %s', (reason, plan, change, _what) => {
    expect(findUnfitReason(plan, by, underTest(change, plan.system))).toBe(reason);
  });

  it('takes no plan of a stage that is gone', () => {
    expect(findUnfitReason(cut, by, { ...by, tests: [] })).toBe('method');
  });
});
