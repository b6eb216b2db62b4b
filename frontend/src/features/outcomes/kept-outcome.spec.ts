import { afterEach, describe, expect, it } from 'vitest';
import { dropKeptOutcome, findKeptOutcome, keepOutcome, type KeptOutcome } from './kept-outcome';

const owner = { personId: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c77', visitId: '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0c01' };
const key = `holdwater.outcome-draft.${owner.personId}.${owner.visitId}`;
const now = new Date('2026-04-15T15:05:00Z');
const draft: KeptOutcome['draft'] = {
  kind: 'seen',
  notReady: null,
  noAccess: null,
  systems: { '1.water': { answer: 'pass', needle: 'stayed', reading: '56', note: '' } },
  lookedAt: ['slope'],
  corrections: [],
  decisions: { a: { is: 'reopen', why: 'still drips' } },
  note: 'Wet slab',
};
const typed = { draft, correction: null };

afterEach(() => window.localStorage.clear());

// What is kept and for whom: a rule of our own, no outside source.
describe('a draft kept on the device', () => {
  it('comes back as it was typed, with when', () => {
    keepOutcome(owner, typed, now);
    expect(findKeptOutcome(owner)).toEqual({ version: 1, keptAt: '2026-04-15T15:05:00.000Z', ...typed });
  });

  it('is of one person and one visit', () => {
    keepOutcome(owner, typed, now);
    expect(findKeptOutcome({ ...owner, personId: 'another' })).toBeNull();
    expect(findKeptOutcome({ ...owner, visitId: 'another' })).toBeNull();
  });

  it('is not kept while nothing is typed, and let go when it is', () => {
    keepOutcome(owner, typed, now);
    const nothing = { ...draft, systems: {}, lookedAt: [], decisions: {}, note: '' };
    keepOutcome(owner, { draft: nothing, correction: null }, now);
    expect(window.localStorage.length).toBe(0);
    keepOutcome(owner, typed, now);
    dropKeptOutcome(owner);
    expect(window.localStorage.length).toBe(0);
  });

  it.each([
    ['of another version', { version: 2, keptAt: now.toISOString(), ...typed }],
    [
      'of another shape',
      { version: 1, keptAt: now.toISOString(), draft: { ...draft, systems: 'none' }, correction: null },
    ],
  ])('%s is not read', (_, stored) => {
    window.localStorage.setItem(key, JSON.stringify(stored));
    expect(findKeptOutcome(owner)).toBeNull();
  });

  it('that is no JSON is not read', () => {
    window.localStorage.setItem(key, '{');
    expect(findKeptOutcome(owner)).toBeNull();
  });

  it('is let go after two weeks, when another is kept; what is not ours stays', () => {
    const old = { ...owner, visitId: 'old' };
    keepOutcome(old, typed, new Date(now.getTime() - 15 * 86_400_000));
    window.localStorage.setItem('holdwater.other', 'stays');
    keepOutcome(owner, typed, now);
    expect(findKeptOutcome(old)).toBeNull();
    expect(findKeptOutcome(owner)).not.toBeNull();
    expect(window.localStorage.getItem('holdwater.other')).toBe('stays');
  });
});
