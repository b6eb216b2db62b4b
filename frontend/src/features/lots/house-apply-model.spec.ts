import { describe, expect, it } from 'vitest';
import { unitStanding, wishedUnits } from './house-apply-model';
import { modelledUnitOf, originOf, planId } from './testing/house-fixtures';

describe('units to be given a model', () => {
  const own = modelledUnitOf('2', { isByHand: true });
  const carried = modelledUnitOf('3', { isByHand: true, canKeepChanges: true, origin: originOf(['atticCutFt']) });

  it('leave out houses changed on their lot until it is said what becomes of them', () => {
    const picked = [modelledUnitOf('1'), own, carried];
    expect(wishedUnits(picked, {}).map(({ lotId }) => lotId)).toEqual([picked[0]?.lotId]);
    const answers = { [`${own.lotId} 1`]: 'replace', [`${carried.lotId} 1`]: 'keep-changes' } as const;
    expect(wishedUnits(picked, answers).map(({ whenChanged }) => whenChanged)).toEqual([
      'ask',
      'replace',
      'keep-changes',
    ]);
  });

  it('stand to the model in one way each', () => {
    expect(unitStanding(modelledUnitOf('1'), planId)).toBe('unmeasured');
    expect(unitStanding(own, planId)).toBe('byHand');
    expect(unitStanding(carried, planId)).toBe('changed');
    expect(unitStanding(modelledUnitOf('4', { isMeasured: true, isSame: true, origin: originOf([]) }), planId)).toBe(
      'same',
    );
    expect(unitStanding(modelledUnitOf('5', { isMeasured: true, origin: originOf([]) }), planId)).toBe('behind');
    expect(unitStanding(modelledUnitOf('6', { isMeasured: true, origin: originOf([]) }), 'another')).toBe('other');
    expect(unitStanding(modelledUnitOf('7', { isMeasured: true }), planId)).toBe('alike');
  });
});
