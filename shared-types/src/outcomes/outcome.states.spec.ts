import { describe, expect, it } from 'vitest';
import { outcomeOf } from './outcome.states.js';

describe('the outcome of a visit, as the definitions pin it', () => {
  it.each([
    [['pass', 'pass'] as const, false, 'pass', null],
    [['pass', 'pass'] as const, true, 'fail', null],
    [['pass', 'fail'] as const, false, 'fail', null],
    [['fail', 'not-seen'] as const, false, 'fail', null],
    [['pass', 'not-seen'] as const, false, 'fail', 'not-seen'],
    [['not-seen'] as const, true, 'fail', null],
    [[] as const, false, 'pass', null],
    [[] as const, true, 'fail', null],
  ])('%j, work failed %s: %s %s', (answers, hasWorkFailed, kind, reason) => {
    expect(outcomeOf(answers, hasWorkFailed)).toEqual({ kind, reason });
  });
});
