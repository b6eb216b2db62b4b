import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type DialRequest, type Point, secondDial } from './second/dial.js';
import { maybe } from './inputs/measures.js';
import { agree } from './support/agreement.js';
import { useCalcServer } from './support/calc-server.js';
import { differences } from './support/differences.js';

/** A point around the center at degrees clockwise from straight up, as a photo has it: y grows downward. */
function pointAt(center: Point, degrees: number, radius: number): Point {
  const angle = (degrees * Math.PI) / 180;
  return { x: center.x + radius * Math.sin(angle), y: center.y - radius * Math.cos(angle) };
}

const photos: fc.Arbitrary<DialRequest> = fc
  .record({
    center: fc.record({ x: fc.integer({ min: 0, max: 4000 }), y: fc.integer({ min: 0, max: 3000 }) }),
    zero: fc.integer({ min: 0, max: 359 }),
    sweep: fc.integer({ min: 20, max: 340 }),
    // odd tenths: never on a mark, nor midway between the two, where rounding of pixels would decide
    needle: fc.integer({ min: 0, max: 359 }).map((n) => n + 0.3),
    radii: fc.tuple(...[1, 2, 3].map(() => fc.integer({ min: 20, max: 900 }))),
    rangePsi: fc.constantFrom(15, 60, 100, 200, 300),
    typedShare: fc.integer({ min: 0, max: 97 }),
    hasTyped: fc.boolean(),
    incrementPsi: maybe(fc.constantFrom(0.1, 1, 2, 5)),
  })
  .map(({ center, zero, sweep, needle, radii, rangePsi, typedShare, hasTyped, incrementPsi }) => ({
    center,
    zeroMark: pointAt(center, zero, radii[0] ?? 100),
    fullMark: pointAt(center, zero + sweep, radii[1] ?? 100),
    needleTip: pointAt(center, zero + needle, radii[2] ?? 100),
    rangePsi,
    typedPsi: hasTyped ? Math.min(rangePsi, (needle / sweep) * rangePsi + (typedShare - 48) / 17) : undefined,
    incrementPsi,
  }))
  .filter(({ typedPsi }) => typedPsi === undefined || typedPsi >= 0);

describe('a dial read from its photo', () => {
  const server = useCalcServer();
  const center = { x: 500, y: 500 };
  const dial = { center, zeroMark: pointAt(center, 225, 300), fullMark: pointAt(center, 135, 300), rangePsi: 200 };
  const read = async (degrees: number) =>
    server.answer('dial', { ...dial, needleTip: pointAt(center, degrees, 250) }) as unknown as Promise<{
      psi: number;
      sweepDegrees: number;
      agrees: boolean | null;
    }>;

  it('computed twice is the same in every field', async () => {
    await agree(photos, async (given) => differences(secondDial(given), await server.answer('dial', given)));
  });

  it.each([
    // geometry: a dial from half past seven clockwise to half past four sweeps 270°
    ['straight up', 0, 100],
    ['at nine', 270, 200 / 6],
    ['at three', 90, 200 * (5 / 6)],
    ['in the dead sector nearer zero', 215, 0],
    ['in the dead sector nearer full', 145, 200],
  ])('%s', async (_name, degrees, psi) => {
    const answer = await read(degrees);
    expect(answer.sweepDegrees).toBeCloseTo(270, 9);
    expect(answer.psi).toBeCloseTo(psi, 9);
    expect(answer.agrees).toBeNull();
  });

  it('takes a needle midway in the dead sector for zero', async () => {
    // whole pixels, so that the tie is one: half past seven, half past four, and six o'clock
    const marks = { zeroMark: { x: 300, y: 700 }, fullMark: { x: 700, y: 700 }, needleTip: { x: 500, y: 800 } };
    expect(await server.answer('dial', { center, rangePsi: 200, ...marks })).toMatchObject({ psi: 0 });
  });
});
