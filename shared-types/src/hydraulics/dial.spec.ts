import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dialInput, type DialGiven } from './dial.contract.js';
import { readDial } from './dial.js';

const center = { x: 400, y: 300 };
/** A point on a circle around the center, clockwise from straight up as on a clock face. */
const onClock = (degrees: number, radius = 200) => ({
  x: center.x + radius * Math.sin((degrees * Math.PI) / 180),
  y: center.y - radius * Math.cos((degrees * Math.PI) / 180),
});
/** The usual face: zero at half past seven, full at half past four, 270° between (common practice, no published source). */
const face: DialGiven = {
  center,
  zeroMark: onClock(225),
  fullMark: onClock(135),
  needleTip: onClock(0),
  rangePsi: 200,
};
const read = (changes: Partial<DialGiven> = {}) => readDial(dialInput.parse({ ...face, ...changes }));
const refusals = (changes: Record<string, unknown>) =>
  Object.fromEntries(
    (dialInput.safeParse({ ...face, ...changes }).error?.issues ?? []).map(({ path, message }) => [
      path.join('.'),
      message,
    ]),
  );

describe('reading a dial', () => {
  it('a needle straight up on a face of 270° shows half', () => {
    expect(read().psi).toBeCloseTo(100, 9);
    expect(read().sweepDegrees).toBeCloseTo(270, 9);
  });

  it('image y grows downward: a quarter turn clockwise of zero is not one against it', () => {
    expect(read({ needleTip: onClock(225 + 67.5) }).psi).toBeCloseTo(50, 9);
  });

  it('rests on the nearer end in the dead sector, a tie on zero', () => {
    expect(read({ needleTip: onClock(215) }).psi).toBe(0);
    expect(read({ needleTip: onClock(145) }).psi).toBe(200);
    expect(read({ needleTip: onClock(180) }).psi).toBe(0);
    expect(read({ needleTip: onClock(225) }).psi).toBeCloseTo(0, 9);
    expect(read({ needleTip: onClock(135) }).psi).toBeCloseTo(200, 9);
  });

  it('agrees within one increment, and says nothing without both', () => {
    expect(read({ typedPsi: 101, incrementPsi: 1 }).agrees).toBe(true);
    expect(read({ typedPsi: 101.1, incrementPsi: 1 }).agrees).toBe(false);
    expect(read({ typedPsi: 99 }).agrees).toBeNull();
    expect(read({ incrementPsi: 1 }).agrees).toBeNull();
  });

  it('does not mind how the photo is turned, moved or enlarged', () => {
    const angle = fc.double({ min: 0, max: 360, noNaN: true });
    const share = fc.double({ min: 0.01, max: 0.99, noNaN: true });
    fc.assert(
      fc.property(
        share,
        angle,
        fc.double({ min: 30, max: 350, noNaN: true }),
        fc.double({ min: 20, max: 4000, noNaN: true }),
        (part, turn, sweep, radius) => {
          const { psi, sweepDegrees } = read({
            zeroMark: onClock(turn, radius),
            fullMark: onClock(turn + sweep, radius / 2),
            needleTip: onClock(turn + part * sweep, radius * 0.9),
          });
          expect(sweepDegrees).toBeCloseTo(sweep, 6);
          expect(psi).toBeCloseTo(part * 200, 6);
        },
      ),
    );
  });
});

describe('bad points', () => {
  it.each<[string, Record<string, unknown>, Record<string, string>]>([
    ['a needle on the center', { needleTip: center }, { needleTip: 'point-on-center' }],
    [
      'both marks on the center',
      { zeroMark: center, fullMark: center },
      { zeroMark: 'point-on-center', fullMark: 'point-on-center' },
    ],
    ['marks in one direction', { fullMark: onClock(225, 50) }, { fullMark: 'marks-in-one-direction' }],
    ['a range of zero', { rangePsi: 0 }, { rangePsi: 'must-be-positive' }],
    ['an increment of zero', { incrementPsi: 0 }, { incrementPsi: 'must-be-positive' }],
    ['half a point', { needleTip: { x: 1 } }, { 'needleTip.y': 'required' }],
    ['an unknown key', { angle: 3 }, { '': 'unknown' }],
  ])('%s are refused', (_, changes, expected) => {
    expect(refusals(changes)).toEqual(expected);
  });
});
