import type { Outcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { describe, expect, it } from 'vitest';
import { clearChecks, type ClearFacts } from './clear-checks';
import { correctionOf, holdOf, uuid } from './testing/lot-fixtures';

// What clear rests on: definitions, "Hold, correction, clear".
const base: ClearFacts = {
  ...{ stageCode: 'rough-in', unitNumber: 1, systems: ['dwv', 'water'], state: 'under-test' },
  ...{ corrections: [], holds: [], outcome: null },
};

const outcome: Outcome = {
  ...{ id: uuid(1), visitId: uuid(2), kind: 'fail', reason: null, note: null, byName: 'Noor Haverty' },
  ...{ at: '2026-04-10T16:00:00Z', receivedAt: '2026-04-10T16:00:00Z' },
  systems: [
    { unitNumber: 1, system: 'dwv', answer: 'fail', needle: null, pressurePsi: null, levelIn: null, note: null },
    { unitNumber: 1, system: 'water', answer: 'pass', needle: null, pressurePsi: null, levelIn: null, note: null },
    { unitNumber: 2, system: 'dwv', answer: 'pass', needle: null, pressurePsi: null, levelIn: null, note: null },
  ],
  work: [
    { pointCode: 'slope', label: { en: 'Slope' }, isLookedAt: true },
    { pointCode: 'sleeves', label: { en: 'Sleeves' }, isLookedAt: false },
  ],
};

const find = (facts: ClearFacts, key: string) => clearChecks(facts).find((check) => check.key === key);

describe('what is left before plumbing is clear', () => {
  it('begins with every system and the work to be seen', () => {
    expect(clearChecks(base).map(({ key, isDone }) => [key, isDone])).toEqual([
      ['dwv', false],
      ['water', false],
      ['work', false],
    ]);
  });

  it('takes a system as passed only for the unit it was passed in', () => {
    expect(find({ ...base, outcome }, 'dwv')?.isDone).toBe(false);
    expect(find({ ...base, outcome }, 'water')?.isDone).toBe(true);
    expect(find({ ...base, outcome, unitNumber: 2 }, 'dwv')?.isDone).toBe(true);
  });

  it('counts the work that was looked at', () => {
    expect(find({ ...base, outcome }, 'work')).toMatchObject({ done: 1, total: 2, isDone: false });
  });

  it('binds by corrections before cover alone, of this stage and unit', () => {
    const corrections = [
      correctionOf({ state: 'accepted' }),
      correctionOf({ id: uuid(3), number: 2, state: 'fixed' }),
      correctionOf({ id: uuid(4), number: 3, severity: 'note' }),
      correctionOf({ id: uuid(5), number: 4, stageCode: 'groundwork' }),
    ];
    expect(find({ ...base, corrections }, 'accepted')).toMatchObject({ done: 1, total: 2 });
    expect(find({ ...base, corrections }, 'fixed')).toMatchObject({ done: 2, total: 3 });
  });

  it('keeps the vent cut to put back until the server says clear', () => {
    const holds = [holdOf({ system: 'dwv', method: 'attic-cut' })];
    expect(find({ ...base, holds, state: 'put-back-due' }, 'putBack')).toMatchObject({ done: 0, total: 1 });
    expect(find({ ...base, holds, state: 'clear' }, 'putBack')?.isDone).toBe(true);
    expect(find({ ...base, holds: [holdOf({ system: 'dwv', method: 'stack-to-roof' })] }, 'putBack')).toBeUndefined();
  });
});
