import { describe, expect, it } from 'vitest';
import { correctionMoves, correctionStates } from '@holdwater/shared-types/outcomes/correction.states.js';
import { AppError } from '../common/errors/app-error.js';
import { requireCorrectionMove } from './correction-moves.service.js';

/** `open → fixed → accepted`, `fixed → open`, written out again from the definitions; what is refused, and how. */
const expected: Record<string, string> = {
  'open fix': 'made',
  'open accept': 'correction-unfixed',
  'open reopen': 'correction-unfixed',
  'fixed fix': 'stale-state',
  'fixed accept': 'made',
  'fixed reopen': 'made',
  'accepted fix': 'stale-state',
  'accepted accept': 'stale-state',
  'accepted reopen': 'stale-state',
};

describe('the moves of a correction', () => {
  it('are made only from where the definitions let them, and refused for what it is', () => {
    const found: Record<string, string> = {};
    for (const state of correctionStates) {
      for (const move of correctionMoves) found[`${state} ${move}`] = resultOf(state, move);
    }
    expect(found).toEqual(expected);
  });
});

function resultOf(state: (typeof correctionStates)[number], move: (typeof correctionMoves)[number]): string {
  try {
    requireCorrectionMove({ state, version: 3, number: 1 }, move);
    return 'made';
  } catch (error) {
    return error instanceof AppError ? error.code : 'other';
  }
}
