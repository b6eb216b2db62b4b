import { describe, expect, it } from 'vitest';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { currentStageOf, lotStages, worstState } from './lot-stages.js';

const { stages } = ruleCardContent();

// the order of the states is pinned in definitions, "Clear"
describe('stages of a lot', () => {
  it('takes the state furthest from clear for a house of several units', () => {
    expect(worstState(['clear', 'corrections-open', 'put-back-due'])).toBe('corrections-open');
    expect(worstState(['corrections-open', 'not-tested'])).toBe('not-tested');
    expect(worstState(['clear', 'clear'])).toBe('clear');
  });

  it('follows the order of the department, not that of the list', () => {
    expect(lotStages([...stages].reverse(), [1], []).map(({ code }) => code)).toEqual([
      'groundwork',
      'rough-in',
      'final',
    ]);
  });

  it('reads what has no row as not tested, unit by unit', () => {
    const [groundwork] = lotStages(stages, [1, 2], [{ unitNumber: 1, stageCode: 'groundwork', state: 'clear' }]);
    expect(groundwork).toMatchObject({
      state: 'not-tested',
      units: [
        { unitNumber: 1, state: 'clear' },
        { unitNumber: 2, state: 'not-tested' },
      ],
    });
  });

  it('names the first stage that is not clear as the current one', () => {
    const clear = (stageCode: string) => ({ unitNumber: 1, stageCode, state: 'clear' as const });
    expect(currentStageOf(lotStages(stages, [1], [clear('groundwork')]))).toBe('rough-in');
    expect(
      currentStageOf(
        lotStages(
          stages,
          [1],
          stages.map(({ code }) => clear(code)),
        ),
      ),
    ).toBeNull();
    expect(currentStageOf([])).toBeNull();
  });
});
