import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  convertLength,
  convertMass,
  convertPressure,
  convertTemperature,
  convertVolume,
  rankine,
  type LengthUnit,
  type PressureUnit,
  type VolumeUnit,
} from './units.js';

const pressureUnits: PressureUnit[] = ['psi', 'kPa', 'bar', 'inHg', 'ftH2O', 'inH2O', 'mH2O'];
const lengthUnits: LengthUnit[] = ['ft', 'in', 'm'];
const volumeUnits: VolumeUnit[] = ['gal', 'L'];
const amount = fc.double({ min: -1e6, max: 1e6, noNaN: true });

/** A there-and-back may cost a few of the last bits. */
function near(value: number, expected: number): void {
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-12 * Math.max(1, Math.abs(expected)));
}

describe('pressure units', () => {
  it.each<[PressureUnit, number]>([
    ['psi', 6894.757293168361], // exact definitions: 0.45359237 kg · 9.80665 m/s² ÷ (0.0254 m)²
    ['inHg', 3386.389], // NIST SP 811, inch of mercury, conventional
    ['ftH2O', 2989.067], // NIST SP 811, foot of water, conventional
    ['inH2O', 249.0889], // NIST SP 811, inch of water, conventional
    ['bar', 100_000], // NIST SP 811
    ['mH2O', 9806.65], // NIST SP 811, 10 × centimetre of water, conventional, 98.0665 Pa
  ])('one %s is %d Pa', (unit, pascal) => {
    near(convertPressure(1, unit, 'kPa') * 1000, pascal);
  });

  // Computed from exact definitions; half of the last printed digit is allowed.
  it.each([
    [50, 344.738],
    [80, 551.581],
    [150, 1034.214],
  ])('%d psi are %d kPa', (psi, kPa) => {
    expect(convertPressure(psi, 'psi', 'kPa')).toBeCloseTo(kPa, 3);
  });

  it('5 psi and 10 inHg, the two ways of one rule, are not equal', () => {
    // Computed from NIST SP 811 factors, printed to three places.
    expect(convertPressure(5, 'psi', 'inHg')).toBeCloseTo(10.18, 3);
    expect(convertPressure(10, 'inHg', 'psi')).toBeCloseTo(4.912, 3);
  });

  it('10 ft of conventional water are 29.8907 kPa', () => {
    expect(convertPressure(10, 'ftH2O', 'kPa')).toBeCloseTo(29.8907, 4); // NIST SP 811 factor
    expect(convertPressure(10, 'ftH2O', 'kPa')).toBeCloseTo(29.9, 1); // LAC 51:XIV.319 prints 29.9
    expect(convertPressure(1, 'ftH2O', 'psi')).toBeCloseTo(0.433528, 6); // computed from exact definitions
  });
});

describe('other units', () => {
  it('feet, inches, gallons and pounds have their exact sizes', () => {
    // NIST SP 811: 1 ft = 0.3048 m, 1 in = 0.0254 m, 1 gal (US) = 3.785412 L (231 in³), 1 lb = 0.45359237 kg.
    near(convertLength(1, 'ft', 'm'), 0.3048);
    near(convertLength(12, 'in', 'ft'), 1);
    expect(convertVolume(1, 'gal', 'L')).toBeCloseTo(3.785412, 6);
    near(convertVolume(1, 'gal', 'L'), (231 * 2.54 ** 3) / 1000);
    near(convertMass(1, 'lb', 'kg'), 0.45359237);
  });

  it('10 ft are 3048 mm, as the model code prints', () => {
    near(convertLength(10, 'ft', 'm') * 1000, 3048); // IRC P2503.5.1
  });

  it('temperature scales meet where they are defined to', () => {
    expect(convertTemperature(32, 'F', 'C')).toBe(0); // NIST SP 811
    expect(convertTemperature(212, 'F', 'C')).toBe(100);
    expect(convertTemperature(-40, 'C', 'F')).toBe(-40);
    expect(rankine(-459.67)).toBe(0);
  });
});

describe('there and back', () => {
  it('gives the same value in every pair of units', () => {
    fc.assert(
      fc.property(amount, fc.constantFrom(...pressureUnits), fc.constantFrom(...pressureUnits), (value, from, to) =>
        near(convertPressure(convertPressure(value, from, to), to, from), value),
      ),
    );
    fc.assert(
      fc.property(amount, fc.constantFrom(...lengthUnits), fc.constantFrom(...lengthUnits), (value, from, to) =>
        near(convertLength(convertLength(value, from, to), to, from), value),
      ),
    );
    fc.assert(
      fc.property(amount, fc.constantFrom(...volumeUnits), fc.constantFrom(...volumeUnits), (value, from, to) =>
        near(convertVolume(convertVolume(value, from, to), to, from), value),
      ),
    );
    // Two additions of 32 may cost more of the last bits near zero.
    fc.assert(
      fc.property(amount, (value) => {
        expect(Math.abs(convertTemperature(convertTemperature(value, 'F', 'C'), 'C', 'F') - value)).toBeLessThan(1e-9);
      }),
    );
  });
});
