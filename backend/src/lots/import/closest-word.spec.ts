import { importColumns } from '@holdwater/shared-types/lots/lot-import.contract.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { closestWord, editDistance } from './closest-word.js';

describe('distance between words', () => {
  // the worked examples of Wagner and Fischer's and Levenshtein's measure as textbooks print them; from memory
  it.each([
    ['kitten', 'sitting', 3],
    ['saturday', 'sunday', 3],
    ['flaw', 'lawn', 2],
    ['', 'abc', 3],
    ['same', 'same', 0],
  ])('from %s to %s is %i', (one, other, edits) => {
    expect(editDistance(one, other)).toBe(edits);
    expect(editDistance(other, one)).toBe(edits);
  });

  it('is a metric: nought for equals alone, and no way round is shorter', () => {
    const word = fc.string({ maxLength: 8 });
    fc.assert(
      fc.property(word, word, word, (a, b, c) => {
        expect(editDistance(a, b) === 0).toBe(a === b);
        expect(editDistance(a, c)).toBeLessThanOrEqual(editDistance(a, b) + editDistance(b, c));
      }),
      { numRuns: 100 },
    );
  });
});

describe('the word probably meant', () => {
  it.each([
    ['adress', 'address'],
    ['Lattitude', 'latitude'],
    ['permit_nummber', 'permit_number'],
    ['hazard', 'hazards'],
    ['color', null],
    ['', null],
  ])('for %s is %s', (given, meant) => {
    expect(closestWord(given, importColumns)).toBe(meant);
  });
});
