import { describe, expect, it } from 'vitest';
import { dwvMethods } from '@holdwater/shared-types/holds/hold.states.js';
import { planTools } from '@holdwater/shared-types/plans/plan-tools.js';
import { planWays } from '@holdwater/shared-types/plans/plan-ways.js';
import { planSteps, stepCodes } from './plan-steps';
import { measuredHouse, ruleOf, waysOf } from './testing/plan-fixtures';

const tools = planTools.parse({});

/** The order of the steps is common practice, no published source. */
describe('the steps of a test', () => {
  const codesOf = (method: string) => {
    const way = waysOf('dwv').find((each) => each.method === method);
    if (way === undefined) throw new Error(method);
    return planSteps({ way, tools, cappedVents: 1, settleMinutes: 0 }).map(({ code }) => code);
  };

  it('close what is open first, then fill, look, mark, and hang the tag last', () => {
    expect(codesOf('attic-cut')).toEqual([
      ...['cap-openings', 'set-plugs', 'cap-vents', 'cut-vent', 'fill-to', 'look-at-joints', 'mark-level', 'hang-tag'],
    ]);
    expect(codesOf('stack-to-roof')[3]).toBe('fill-from-roof');
    expect(codesOf('laundry-box')[3]).toBe('open-knockout');
  });

  it('fill lift after lift where there is more than one', () => {
    const rule = { ...ruleOf('dwv'), acceptedMethods: ['sectional' as const] };
    const short = planTools.parse({ maxSectionFt: 15 });
    const ways = planWays({ house: measuredHouse, rule, isGroundwork: false, tools: short, elevationFt: 0 });
    const way = ways.find(({ method }) => method === 'sectional');
    const steps = way === undefined ? [] : planSteps({ way, tools, cappedVents: 0, settleMinutes: 0 });
    expect(steps.find(({ code }) => code === 'fill-lifts')?.count).toBe(way?.dwv?.lifts?.length);
    expect(steps.map(({ code }) => code)).not.toContain('fill-to');
  });

  it('pump lines up, wait for the pipe to stretch, and pump again', () => {
    const [way] = waysOf('water');
    const steps = way === undefined ? [] : planSteps({ way, tools, cappedVents: 0, settleMinutes: 60 });
    expect(steps.map(({ code }) => code)).toEqual([
      ...['isolate', 'set-gauge', 'fill-and-bleed', 'shut-main', 'pump-to', 'settle', 'shut-gauge-valve', 'hang-tag'],
    ]);
    expect(steps.find(({ code }) => code === 'settle')).toMatchObject({ minutes: 60, psi: 120 });
  });

  it('are none where nothing could be worked out, and every one has a name of its own', () => {
    for (const way of waysOf('dwv', { ...measuredHouse, lowestFittingFt: null })) {
      expect(planSteps({ way, tools, cappedVents: 0, settleMinutes: 0 })).toEqual([]);
    }
    for (const method of dwvMethods) {
      for (const code of codesOf(method)) expect(stepCodes).toContain(code);
    }
  });
});
