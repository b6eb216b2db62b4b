import fc from 'fast-check';
import { metersPerFoot, pascalsPerPsi } from '../second/physics.js';

/** A height or length in feet: in quarter feet as a tape has it, or in whole centimeters, which no binary fraction of a foot is. */
export function feet(min: number, max: number): fc.Arbitrary<number> {
  const quarters = fc.integer({ min: Math.ceil(min * 4), max: Math.floor(max * 4) }).map((n) => n / 4);
  const perFoot = metersPerFoot * 100;
  const centimeters = fc
    .integer({ min: Math.ceil(min * perFoot), max: Math.floor(max * perFoot) })
    .map((n) => n / perFoot);
  return fc.oneof(quarters, quarters, centimeters);
}

/** A pressure in psi: in tenths, or in whole kilopascals. */
export function psi(min: number, max: number): fc.Arbitrary<number> {
  const tenths = fc.integer({ min: min * 10, max: max * 10 }).map((n) => n / 10);
  const perPsi = pascalsPerPsi / 1000;
  const kilopascals = fc
    .integer({ min: Math.ceil(min * perPsi), max: Math.floor(max * perPsi) })
    .map((n) => n / perPsi);
  return fc.oneof(tenths, tenths, kilopascals);
}

/** A gauge's increment in psi: those sold, and metric ones (1 and 10 kPa, 0.05 bar). */
export const increment = fc.constantFrom(
  ...[0.1, 0.2, 0.5, 1, 2, 2.5, 5],
  ...[1000 / pascalsPerPsi, 10_000 / pascalsPerPsi, 5000 / pascalsPerPsi],
);

/** A field that may be there, null or absent: null means absent. */
export function maybe<T>(arbitrary: fc.Arbitrary<T>): fc.Arbitrary<T | null | undefined> {
  return fc.oneof(
    { weight: 3, arbitrary },
    { weight: 1, arbitrary: fc.constant(null) },
    { weight: 1, arbitrary: fc.constant(undefined) },
  );
}

/** A field that may be absent. */
export const orAbsent = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined, freq: 3 });

export const waterTempF = orAbsent(fc.integer({ min: 32, max: 212 }));
export const elevationFt = orAbsent(fc.integer({ min: -250, max: 12_000 }));

const floorNames = ['basement', 'first', 'second', 'third', 'loft'];
/** Floors in no order, no two at one elevation. */
export function floorsWithin(min: number, max: number, minLength = 0) {
  return fc
    .uniqueArray(feet(min, max), { minLength, maxLength: floorNames.length })
    .map((elevations) => elevations.map((at, index) => ({ name: floorNames[index] ?? '', elevationFt: at })));
}
