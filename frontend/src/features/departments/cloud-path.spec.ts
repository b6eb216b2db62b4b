import { describe, expect, it } from 'vitest';
import { changedWords } from './changed-words';
import { cloudPath } from './cloud-path';

/** Ends of the arcs of a path. */
const ends = (path: string) =>
  [...path.matchAll(/A[\d.]+ [\d.]+ 0 0 1 ([\d.]+) ([\d.]+)/g)].map(([, x, y]) => [Number(x), Number(y)] as const);

describe('a revision cloud', () => {
  it('runs once round the box in whole scallops and ends where it began', () => {
    const path = cloudPath(328, 42);
    const [, x, y] = /^M([\d.]+) ([\d.]+)/.exec(path) ?? [];
    expect(ends(path).at(-1)).toEqual([Number(x), Number(y)]);
    for (const [endX, endY] of ends(path)) {
      const isOnEdge = [endX === Number(x), endX === 328 - Number(x), endY === Number(y), endY === 42 - Number(y)];
      expect(isOnEdge.some(Boolean)).toBe(true);
    }
    expect(path.endsWith('Z')).toBe(true);
  });

  it('is not drawn round nothing', () => {
    expect(cloudPath(0, 0)).toBe('');
  });
});

describe('words that are new in a line', () => {
  it('are those that did not stand there before', () => {
    // mockup H: "60 psi" is set off in "100 psi with water, 60 psi with air"
    expect(changedWords('50 psi with air', '60 psi with air')).toEqual([
      { text: '60', isNew: true },
      { text: 'psi with air', isNew: false },
    ]);
    expect(changedWords('', 'new words')).toEqual([{ text: 'new words', isNew: true }]);
    expect(changedWords('a b', 'a b')).toEqual([{ text: 'a b', isNew: false }]);
  });
});
