import { describe, expect, it } from 'vitest';
import { nextMoves, stateAfter, visitMoveTable, visitMoves, visitStates, type VisitState } from './visit.states.js';

/** The pinned definitions of the product, written out again pair by pair, as the independent copy of the table. */
const pinned: Array<[VisitState, VisitState]> = [
  ['requested', 'booked'],
  ['requested', 'declined'],
  ['requested', 'withdrawn'],
  ['booked', 'withdrawn'],
  ['ready', 'withdrawn'],
  ['booked', 'ready'],
  ['ready', 'booked'],
  ['booked', 'underway'],
  ['ready', 'underway'],
  ['underway', 'booked'],
  ['underway', 'ready'],
  ['underway', 'closed'],
  ['booked', 'freed'],
  ['ready', 'freed'],
  ['booked', 'requested'],
  ['ready', 'requested'],
  ['underway', 'requested'],
];

describe('the table of visit moves', () => {
  it('leads exactly where the definitions say, and nowhere else', () => {
    const led = new Set<string>();
    for (const from of visitStates) {
      for (const move of visitMoves) {
        for (const before of ['booked', 'ready'] as const) {
          const to = stateAfter(from, move, before);
          if (to !== null && to !== from) led.add(`${from}>${to}`);
        }
      }
    }
    expect([...led].sort()).toEqual(pinned.map(([from, to]) => `${from}>${to}`).sort());
  });

  it('lets a move keep the state from requested, booked and ready only', () => {
    expect(visitStates.filter((state) => stateAfter(state, 'move') === state)).toEqual([
      'requested',
      'booked',
      'ready',
    ]);
  });

  it('has no dead state: every state is reached, and ended states have no way out', () => {
    const ended: VisitState[] = ['closed', 'declined', 'withdrawn', 'freed'];
    for (const state of visitStates) {
      expect(nextMoves(state).length === 0).toBe(ended.includes(state));
      const isReached = state === 'requested' || pinned.some(([, to]) => to === state);
      expect(isReached).toBe(true);
    }
  });

  it('gives every move at least one mover', () => {
    for (const move of visitMoves) expect(visitMoveTable[move].by.length).toBeGreaterThan(0);
  });
});
