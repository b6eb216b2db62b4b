import { describe, expect, it } from 'vitest';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { type ChosenTest, termsOf } from './test-rule.rules.js';

const base = ruleCardContent();
const content = ruleCardContent({
  tests: base.tests.map((rule) => ({
    ...rule,
    settleMinutes: rule.system === 'water' ? 45 : 0,
    ...(rule.stageCode === 'groundwork' && {
      acceptedMethods: ['stack-to-roof', 'air'] as const,
      pressures: [{ medium: 'air' as const, minimumPsi: 5, preferredPsi: null }],
    }),
  })),
});

const water: ChosenTest = { stageCode: 'rough-in', system: 'water', method: 'gauge', medium: 'water', gauge: {} };
const drain: ChosenTest = { stageCode: 'rough-in', system: 'dwv', method: 'stack-to-roof', medium: 'water', tape: {} };
const drainByAir: ChosenTest = { stageCode: 'groundwork', system: 'dwv', method: 'air', medium: 'air', gauge: {} };

describe('the terms of a test', () => {
  it('are those of the rule card: the minimum of its own medium, and the minutes to settle', () => {
    expect(termsOf(content, water)).toEqual({ minimumPsi: 100, settleMinutes: 45 });
    expect(termsOf(content, drain)).toEqual({ minimumPsi: null, settleMinutes: 0 });
    expect(termsOf(content, drainByAir)).toEqual({ minimumPsi: 5, settleMinutes: 0 });
  });

  it('refuses a method the card does not accept, and tells those it does', () => {
    expect(() => termsOf(content, { ...drain, method: 'sectional' })).toThrow(
      expect.objectContaining({
        code: 'method-not-accepted',
        params: { acceptedMethods: ['stack-to-roof', 'attic-cut', 'standpipe', 'laundry-box'] },
        fields: { method: 'method-not-accepted' },
      }),
    );
  });

  it.each<[string, ChosenTest]>([
    ['water with a medium the card has no pressure for', { ...water, medium: 'air' }],
    ['a drain filled with water and topped with air', { ...drain, medium: 'water-topped-with-air' }],
    ['a water method with air', { ...drainByAir, method: 'stack-to-roof' }],
    ['the air method with water', { ...drainByAir, medium: 'water', tape: {} }],
  ])('refuses %s', (_what, chosen) => {
    expect(() => termsOf(content, chosen)).toThrow(
      expect.objectContaining({ code: 'method-not-accepted', fields: { medium: 'medium-not-accepted' } }),
    );
  });

  it('asks for the instrument it is read with', () => {
    expect(() => termsOf(content, { ...water, gauge: null })).toThrow(
      expect.objectContaining({ fields: { gauge: 'required' } }),
    );
    expect(() => termsOf(content, { ...drain, tape: null, gauge: {} })).toThrow(
      expect.objectContaining({ fields: { tape: 'required' } }),
    );
  });

  it('knows no stage and no system the card does not name', () => {
    expect(() => termsOf(content, { ...water, stageCode: 'attic' })).toThrow(
      expect.objectContaining({ code: 'stage-unknown' }),
    );
    expect(() => termsOf(content, { ...water, stageCode: 'groundwork' })).toThrow(
      expect.objectContaining({ code: 'bad-input', fields: { system: 'not-of-this-stage' } }),
    );
  });
});
