import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertTemperature } from './units.js';
import { headPsi, waterDensityKgM3, waterWeightLb } from './water.js';

const densityAtC = (celsius: number): number => waterDensityKgM3(convertTemperature(celsius, 'C', 'F'));
const psiPerFootAtC = (celsius: number): number => headPsi(1, convertTemperature(celsius, 'C', 'F'));

describe('density of water', () => {
  // A published table of the density of water; newer than Kell's formula, which differs by up to 0.004 kg/m³: 0.005 is allowed.
  it.each([
    [0, 999.8395],
    [4, 999.972],
    [10, 999.7026],
    [15, 999.1026],
    [20, 998.2071],
    [25, 997.0479],
    [30, 995.6502],
  ])('at %d °C is %d by the published table', (celsius, density) => {
    expect(Math.abs(densityAtC(celsius) - density)).toBeLessThan(0.005);
  });

  // The same table prints one place from 40 °C on: half of it and the formulas' difference are allowed.
  it.each([
    [40, 992.2],
    [60, 983.2],
    [80, 971.8],
    [100, 958.4],
  ])('at %d °C is %d by the published table', (celsius, density) => {
    expect(Math.abs(densityAtC(celsius) - density)).toBeLessThan(0.06);
  });

  // Kell (1975), J. Chem. Eng. Data 20, 97, printed to four places.
  it.each([
    [20, 998.2041],
    [40, 992.2158],
    [60, 983.1989],
  ])('at %d °C is %d by Kell', (celsius, density) => {
    expect(densityAtC(celsius)).toBeCloseTo(density, 4);
  });
});

describe('head', () => {
  // Computed from the published densities above: at 20 °C they differ from Kell's by 3 parts in a million, at 40 and 60 °C they are
  // printed to 0.1 kg/m³, half of which is 2.2e-5 psi.
  it.each([
    [20, 0.43275, 2e-6],
    [40, 0.430146, 2.2e-5],
    [60, 0.426244, 2.2e-5],
  ])('of one foot at %d °C is %d psi', (celsius, psi, allowed) => {
    expect(Math.abs(psiPerFootAtC(celsius) - psi)).toBeLessThan(allowed);
  });

  it('agrees with a head table at water’s greatest density', () => {
    // engineeringtoolbox, head and pressure: 0.4335 psi/ft, 2.307 ft/psi, 64 ft = 27.7 psi; to the places printed there.
    expect(headPsi(1, 39.2)).toBeCloseTo(0.4335, 4);
    expect(1 / headPsi(1, 39.2)).toBeCloseTo(2.307, 3);
    expect(headPsi(64, 39.2)).toBeCloseTo(27.7, 1);
  });

  // Conventional water (1000 kg/m³), computed; water at 39.2 °F is lighter by 28 parts in a million.
  it.each([
    [5, 2.16764],
    [10, 4.33528],
    [30, 13.0058],
  ])('%d ft are %d psi', (feet, psi) => {
    expect(headPsi(feet, 39.2) / psi).toBeCloseTo(1, 4);
  });

  it('is never below zero', () => {
    expect(headPsi(-4, 60)).toBe(0);
    expect(headPsi(0, 60)).toBe(0);
  });

  it('grows with height and shrinks as warm water thins', () => {
    const feet = fc.double({ min: 0, max: 500, noNaN: true });
    fc.assert(
      fc.property(
        feet,
        fc.double({ min: 0.001, max: 500, noNaN: true }),
        fc.double({ min: 32, max: 212, noNaN: true }),
        (low, more, tempF) => {
          expect(headPsi(low + more, tempF)).toBeGreaterThan(headPsi(low, tempF));
        },
      ),
    );
    // Above 4 °C (39.2 °F) water thins as it warms.
    fc.assert(
      fc.property(fc.double({ min: 40, max: 211, noNaN: true }), (tempF) => {
        expect(headPsi(10, tempF + 1)).toBeLessThan(headPsi(10, tempF));
      }),
    );
  });

  it('weighs a gallon at its usual 8.34 lb', () => {
    expect(waterWeightLb(1, 60)).toBeCloseTo(8.34, 2); // common practice, no published source
  });
});
