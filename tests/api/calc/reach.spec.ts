import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dwvInputs } from './inputs/dwv-inputs.js';
import { holdInputs } from './inputs/hold-inputs.js';
import { waterInputs } from './inputs/water-inputs.js';
import { dwvMethods } from './second/dwv.input.js';
import { secondDwvPlan } from './second/dwv.js';
import { secondHold } from './second/hold.js';
import { secondWaterPlan } from './second/water.js';
import { seed } from './support/agreement.js';

/** The inputs on which both computations are compared bring out everything they could differ in. */
describe('what the compared inputs reach', () => {
  const seen = <T>(inputs: fc.Arbitrary<T>, numRuns: number, tell: (given: T) => (string | null | undefined)[]) =>
    new Set(fc.sample(inputs, { seed, numRuns }).flatMap(tell));

  it('every method and reason of a DWV plan', () => {
    const codes = seen(dwvInputs, 150, (given) => {
      const plan = secondDwvPlan(given);
      const usable = plan.usable ? 'usable' : 'not usable';
      return [given.method, usable, ...plan.reasons.map(({ code }) => code), `${plan.notUnderTest.length} open`];
    });
    const reasons = ['method-not-accepted', 'laundry-not-on-lowest-floor', 'laundry-on-lowest-floor', 'level-short'];
    const all = [...dwvMethods, ...reasons, 'plug-overloaded', 'air-on-plastic', 'usable', '0 open', '1 open'];
    expect(all.filter((each) => !codes.has(each))).toEqual([]);
  });

  it('every reason of a water plan, and the target at the ceiling', () => {
    const codes = seen(waterInputs, 150, (given) => {
      const plan = secondWaterPlan(given);
      const isCapped = plan.targetPsi === plan.ceilingPsi && plan.usable;
      return [...plan.reasons, plan.usable ? 'usable' : null, isCapped ? 'capped' : null, `top up ${plan.needsTopUp}`];
    });
    const reasons = ['medium-not-accepted', 'air-on-plastic', 'above-rated-part', 'gauge-too-coarse', 'gauge-range'];
    const all = [...reasons, 'usable', 'capped', 'top up true', 'top up false', 'top up null'];
    expect(all.filter((each) => !codes.has(each))).toEqual([]);
  });

  it('every verdict, finding and reason of a log', () => {
    const codes = seen(holdInputs, 300, (given) => {
      const { verdict, gaugeFinding, forecast } = secondHold(given);
      return [verdict, gaugeFinding, forecast?.basis, forecast?.holdsThrough, ...(forecast?.reasons ?? [])];
    });
    const verdicts = ['none', 'below', 'settling', 'too-soon', 'slow-fall', 'dropping', 'temperature', 'holding'];
    const findings = ['gauge-sound', 'gauge-leaks-system-held', 'system-dropped', 'open-the-valve-to-know'];
    const reasons = ['temperature-only', 'read-again', 'find-the-leak', 'over-ceiling', 'over-ceiling-when-warm'];
    const all = [...verdicts, ...findings, ...reasons, 'trend', 'yes', 'no', 'maybe'];
    expect(all.filter((each) => !codes.has(each))).toEqual([]);
  });
});
