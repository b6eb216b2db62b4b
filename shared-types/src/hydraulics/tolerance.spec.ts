import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isAbove, isBelow, nextMultipleAbove, roundDownTo, roundUpTo } from './tolerance.js';

describe('comparisons', () => {
  it('allow 1e-9', () => {
    expect(isAbove(1 + 9e-10, 1)).toBe(false);
    expect(isAbove(1 + 2e-9, 1)).toBe(true);
    expect(isBelow(1 - 9e-10, 1)).toBe(false);
    expect(isBelow(1 - 2e-9, 1)).toBe(true);
  });
});

describe('multiples of an increment', () => {
  it('are plain decimals, and a multiple stays itself', () => {
    expect(roundUpTo(0.1, 0.1 + 0.2)).toBe(0.3);
    expect(roundDownTo(0.1, 0.3)).toBe(0.3);
    expect(roundDownTo(2, 146.9)).toBe(146);
    expect(roundUpTo(2, 100.1)).toBe(102);
    expect(nextMultipleAbove(1, 52)).toBe(53);
    expect(nextMultipleAbove(0.1, 4.96)).toBe(5);
    expect(roundDownTo(1, -0.5)).toBe(-1);
  });

  it('lie on their side and less than one increment away', () => {
    const increment = fc.constantFrom(0.05, 0.1, 0.25, 0.5, 1, 2, 5);
    fc.assert(
      fc.property(increment, fc.double({ min: -50, max: 500, noNaN: true }), (step, value) => {
        const [down, up, next] = [roundDownTo(step, value), roundUpTo(step, value), nextMultipleAbove(step, value)];
        expect(isAbove(down, value) || isBelow(up, value)).toBe(false);
        expect(value - down).toBeLessThan(step + 1e-9);
        expect(up - value).toBeLessThan(step + 1e-9);
        expect(next).toBeGreaterThan(value);
        expect(next - value).toBeLessThanOrEqual(step + 2e-9);
      }),
    );
  });
});
