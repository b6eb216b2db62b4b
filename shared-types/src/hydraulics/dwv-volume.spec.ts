import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { volumeBelowGal } from './dwv-volume.js';
import type { Pipe } from './house-fields.js';
import { gallonsPerFoot, nominalSizesIn } from './pipes.js';

const pipe = (changes: Partial<Pipe>): Pipe => ({
  nominalIn: 3,
  material: 'pvc-sch40',
  bottomFt: 0,
  topFt: 10,
  lengthFt: 10,
  ...changes,
});

describe('volume below a level', () => {
  // ASTM D2665 schedule 40, 3 in: 0.38403 gal/ft
  it.each([
    [-1, 0],
    [0, 0],
    [5, 5 * 0.38403],
    [10, 10 * 0.38403],
    [40, 10 * 0.38403],
  ])('of a 10 ft upright with the water at %d ft is %d gal', (levelFt, gallons) => {
    expect(volumeBelowGal([pipe({})], levelFt)).toBeCloseTo(gallons, 4);
  });

  it('counts a sloping pipe by the share of its rise, its whole length over', () => {
    expect(volumeBelowGal([pipe({ topFt: 1, lengthFt: 40 })], 0.5)).toBeCloseTo(20 * 0.38403, 3);
  });

  it('counts a level pipe whole when at or below, else not', () => {
    const level = pipe({ bottomFt: 4, topFt: 4, lengthFt: 12 });
    expect(volumeBelowGal([level], 3.9)).toBe(0);
    expect(volumeBelowGal([level], 4)).toBeCloseTo(12 * 0.38403, 4);
  });

  it('is nothing without pipes', () => {
    expect(volumeBelowGal([], 10)).toBe(0);
  });

  it('is never more than the pipes hold and never less than nothing', () => {
    const length = fc.double({ min: 0, max: 100, noNaN: true });
    const anyPipe = fc
      .record({
        nominalIn: fc.constantFrom(...nominalSizesIn),
        bottomFt: fc.double({ min: -20, max: 40, noNaN: true }),
        rise: length,
        lengthFt: length,
      })
      .map(({ rise, ...rest }) => pipe({ ...rest, topFt: rest.bottomFt + rise }));
    fc.assert(
      fc.property(
        fc.array(anyPipe, { maxLength: 20 }),
        fc.double({ min: -30, max: 160, noNaN: true }),
        (pipes, levelFt) => {
          const whole = pipes.reduce((sum, { lengthFt, nominalIn }) => sum + lengthFt * gallonsPerFoot(nominalIn), 0);
          const volume = volumeBelowGal(pipes, levelFt);
          expect(volume).toBeGreaterThanOrEqual(0);
          expect(volume).toBeLessThanOrEqual(whole + 1e-9);
        },
      ),
    );
  });
});
