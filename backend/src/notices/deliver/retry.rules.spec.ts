import { describe, expect, it } from 'vitest';
import { isFinal, mostAttempts, nextAttemptAt } from './retry.rules.js';

const now = new Date('2027-03-02T16:30:00Z');
const seconds = (attempts: number) => (nextAttemptAt(now, attempts).getTime() - now.getTime()) / 1000;

describe('trying a mail again', () => {
  it('waits longer each time, an hour at most', () => {
    expect([1, 2, 3, 4].map(seconds)).toEqual([30, 60, 120, 240]);
    expect(seconds(20)).toBe(3600);
  });

  it('goes on for most of a day, so that an hour without a mail server loses nothing', () => {
    const total = Array.from({ length: mostAttempts - 1 }, (_, i) => seconds(i + 1)).reduce(
      (sum, each) => sum + each,
      0,
    );
    expect(total / 3600).toBeGreaterThan(20);
  });

  it.each([
    [{ responseCode: 550 }, true],
    [{ responseCode: 451 }, false],
    [{ responseCode: 421 }, false],
    [new Error('connect ECONNREFUSED'), false],
  ])('%j is final: %s (RFC 5321 4.2.1: 5yz is permanent, 4yz transient)', (error, final) => {
    expect(isFinal(error, 1)).toBe(final);
  });

  it('gives up in the end', () => {
    expect(isFinal({ responseCode: 451 }, mostAttempts)).toBe(true);
  });
});
