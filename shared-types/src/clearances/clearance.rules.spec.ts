import { describe, expect, it } from 'vitest';
import { type ClearFacts, clearStateOf, clearStates } from './clearance.rules.js';
import { buriedByMethod, takeDownItems } from './take-down.js';

const nothing: ClearFacts = {
  hasPassed: false,
  corrections: [],
  putBackBeforeCover: 0,
  hasFeeDue: false,
  isRevoked: false,
  openVisit: null,
  isHoldStanding: false,
};
const passed: ClearFacts = { ...nothing, hasPassed: true };
const open = { state: 'open', severity: 'fix-before-cover' } as const;
const fixed = { state: 'fixed', severity: 'fix-before-cover' } as const;

// definitions, "Hold, correction, clear": the states in their pinned order, the first that applies
describe('state of plumbing, from its facts', () => {
  it.each<[string, ClearFacts, string]>([
    ['nothing is known', nothing, 'not-tested'],
    ['a test stands', { ...nothing, isHoldStanding: true }, 'under-test'],
    ['a visit is booked while a test stands', { ...nothing, isHoldStanding: true, openVisit: 'booked' }, 'under-test'],
    ['a visit is booked and nothing stands', { ...nothing, openVisit: 'booked' }, 'not-tested'],
    ['a visit is requested', { ...nothing, openVisit: 'requested' }, 'not-tested'],
    ['the test is up for a visit', { ...nothing, isHoldStanding: true, openVisit: 'ready' }, 'awaiting-visit'],
    ['the inspector is there', { ...nothing, isHoldStanding: true, openVisit: 'underway' }, 'awaiting-visit'],
    ['a correction is open', { ...nothing, corrections: [open] }, 'corrections-open'],
    [
      'a correction is open before final',
      { ...nothing, corrections: [{ ...open, severity: 'fix-before-final' }] },
      'corrections-open',
    ],
    [
      'a correction is open though a visit is ready',
      { ...nothing, corrections: [open], openVisit: 'ready' },
      'corrections-open',
    ],
    [
      'a correction is fixed and no visit comes',
      { ...nothing, corrections: [fixed], isHoldStanding: true },
      'corrections-open',
    ],
    [
      'a correction is fixed and a visit comes',
      { ...nothing, corrections: [fixed], openVisit: 'ready' },
      'awaiting-visit',
    ],
    ['a note alone is open', { ...nothing, corrections: [{ state: 'open', severity: 'note' }] }, 'not-tested'],
    ['all passed', passed, 'clear'],
    [
      'all passed and the corrections were accepted',
      { ...passed, corrections: [{ ...open, state: 'accepted' }] },
      'clear',
    ],
    [
      'all passed, with a correction for the final left open',
      { ...passed, corrections: [{ ...open, severity: 'fix-before-final' }] },
      'clear',
    ],
    ['all passed and something would be buried', { ...passed, putBackBeforeCover: 1 }, 'put-back-due'],
    ['all passed and a fee is due', { ...passed, hasFeeDue: true }, 'put-back-due'],
    ['all passed but a correction waits on the inspector', { ...passed, corrections: [fixed] }, 'corrections-open'],
    ['all passed and the next test stands already', { ...passed, isHoldStanding: true, openVisit: 'ready' }, 'clear'],
    ['it was revoked', { ...passed, isRevoked: true }, 'not-tested'],
    [
      'it was revoked while something would be buried',
      { ...passed, isRevoked: true, putBackBeforeCover: 2 },
      'not-tested',
    ],
    ['it was revoked with a test standing', { ...passed, isRevoked: true, isHoldStanding: true }, 'under-test'],
    ['it was revoked with a correction open', { ...passed, isRevoked: true, corrections: [open] }, 'corrections-open'],
  ])('when %s', (_, facts, state) => {
    expect(clearStateOf(facts)).toBe(state);
  });

  it('never says clear while anything it names is missing', () => {
    const spoilers: Array<Partial<ClearFacts>> = [
      { hasPassed: false },
      { corrections: [open] },
      { corrections: [fixed] },
      { putBackBeforeCover: 1 },
      { hasFeeDue: true },
      { isRevoked: true },
    ];
    for (const spoiler of spoilers) expect(clearStateOf({ ...passed, ...spoiler })).not.toBe('clear');
  });

  it('keeps the pinned order', () => {
    expect(clearStates).toEqual([
      'clear',
      'put-back-due',
      'corrections-open',
      'awaiting-visit',
      'under-test',
      'not-tested',
    ]);
  });
});

describe('what a method leaves behind', () => {
  it('is to be put back before cover, whatever it is', () => {
    for (const items of Object.values(buriedByMethod))
      for (const item of items) expect(takeDownItems[item]).toBe('before-cover');
  });

  it('is nothing where the water stands to the roof and nothing was cut', () => {
    expect(buriedByMethod['stack-to-roof']).toBeUndefined();
    expect(buriedByMethod.gauge).toBeUndefined();
  });
});
