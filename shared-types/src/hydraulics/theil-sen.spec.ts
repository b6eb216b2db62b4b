import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { medianSlope, pairwiseSlopes, senInterval, type Point } from './theil-sen.js';

const points = (x: number[], y: number[]): Point[] => x.map((value, index) => ({ x: value, y: y[index] ?? 0 }));

/** Sen (1968), J. Am. Stat. Assoc. 63, 1379, as used in SciPy's tests of theilslopes. */
const sen = points([1, 2, 3, 4, 10, 12, 18], [9, 15, 19, 20, 45, 55, 78]);

describe('Theil–Sen', () => {
  it('finds Sen’s slope', () => {
    expect(medianSlope(pairwiseSlopes(sen))).toBe(4);
  });

  it('finds Sen’s interval at α 0.07', () => {
    // Sen 1968: 26/7 = 3.7143 and 35/8 = 4.375; the normal quantile of 0.965 is 1.8119 (standard tables).
    const interval = senInterval(pairwiseSlopes(sen), sen.length, 1.8119);
    expect(interval?.low).toBeCloseTo(26 / 7, 12);
    expect(interval?.high).toBeCloseTo(35 / 8, 12);
  });

  it('takes the middle of a tie', () => {
    expect(medianSlope(pairwiseSlopes(points([0, 1, 2], [0, 1, 1])))).toBe(0.5); // SciPy's tests, as above
  });

  it('is not the line of least squares, which Sen’s points draw to 4.021352', () => {
    // Sen 1968. Least squares is worked out here to show that the two answers can be told apart.
    const meanX = sen.reduce((sum, { x }) => sum + x, 0) / sen.length;
    const meanY = sen.reduce((sum, { y }) => sum + y, 0) / sen.length;
    const least =
      sen.reduce((sum, { x, y }) => sum + (x - meanX) * (y - meanY), 0) /
      sen.reduce((sum, { x }) => sum + (x - meanX) ** 2, 0);
    expect(least).toBeCloseTo(4.021352, 6);
    expect(medianSlope(pairwiseSlopes(sen))).not.toBeCloseTo(least, 2);
  });

  it('has no slope and no interval for a single point', () => {
    expect(medianSlope(pairwiseSlopes([{ x: 0, y: 1 }]))).toBe(0);
    expect(senInterval([], 1)).toBeNull();
  });

  it('keeps the ranks within the slopes there are', () => {
    const two = points([0, 1], [0, 3]);
    expect(senInterval(pairwiseSlopes(two), 2)).toEqual({ low: 3, high: 3 });
  });

  it('finds a straight line whatever the points, and shrugs off one wild reading in twelve', () => {
    const slope = fc.double({ min: -50, max: 50, noNaN: true });
    fc.assert(
      fc.property(slope, fc.double({ min: -1e4, max: 1e4, noNaN: true }), fc.nat(11), (rate, wild, at) => {
        const line = Array.from({ length: 12 }, (_, x) => ({ x, y: rate * x + (x === at ? wild : 0) }));
        // 66 pairs, 11 of them spoilt: the median is still one of the sound ones.
        expect(Math.abs(medianSlope(pairwiseSlopes(line)) - rate)).toBeLessThan(1e-9);
      }),
    );
  });
});
