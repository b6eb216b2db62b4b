import { stateAfter, type VisitMove, visitMoves, visitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { describe, expect, it } from 'vitest';
import { consequencesOf } from './move-consequences.js';

const now = new Date('2027-03-03T15:00:00Z');

describe('what a move brings with it', () => {
  it('begins from where the visit was, and takes it back whole', () => {
    expect(consequencesOf('begin', 'ready', 'underway', now)).toEqual({ begunAt: now, begunFrom: 'ready' });
    expect(consequencesOf('begin', 'booked', 'underway', now)).toEqual({ begunAt: now, begunFrom: 'booked' });
    expect(consequencesOf('undo-begin', 'underway', 'ready', now)).toEqual({
      begunAt: null,
      begunBy: null,
      begunFrom: null,
    });
  });

  it('gives back inspector, span and place when not reached, and keeps first place', () => {
    expect(consequencesOf('not-reached', 'underway', 'requested', now)).toEqual({
      hasFirstPlace: true,
      inspectorId: null,
      planned: null,
      place: null,
      readyAt: null,
      begunAt: null,
      begunBy: null,
      begunFrom: null,
    });
  });

  it('marks since when the test is up, and that it is no longer', () => {
    expect(consequencesOf('say-test-up', 'booked', 'ready', now)).toEqual({ readyAt: now });
    for (const move of ['no-longer-up', 'find-not-up'] as const)
      expect(consequencesOf(move, 'ready', 'booked', now)).toEqual({ readyAt: null });
  });

  it('ends with its time exactly where the table leads out of the open states', () => {
    const ended = ['closed', 'declined', 'withdrawn', 'freed'];
    const seen: VisitMove[] = [];
    for (const from of visitStates) {
      for (const move of visitMoves) {
        const to = stateAfter(from, move);
        if (to === null) continue;
        if (ended.includes(to)) seen.push(move);
        expect(consequencesOf(move, from, to, now).endedAt).toEqual(ended.includes(to) ? now : undefined);
      }
    }
    expect([...new Set(seen)].sort()).toEqual(['close', 'decline', 'free-closure', 'free-not-up', 'withdraw']);
  });
});
