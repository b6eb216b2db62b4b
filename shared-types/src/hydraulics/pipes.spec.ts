import { describe, expect, it } from 'vitest';
import {
  boreAreaSqIn,
  gallonsPerFoot,
  insideDiameterIn,
  isNominalSize,
  nominalSizesIn,
  type NominalSizeIn,
} from './pipes.js';

describe('schedule 40 pipe, ID = OD − 2 × minimum wall', () => {
  // ASTM D1785/D2665 dimensions: inside diameters to three places, gallons per foot computed from them to five.
  it.each<[NominalSizeIn, number, number]>([
    [1.25, 1.38, 0.0777],
    [1.5, 1.61, 0.10576],
    [2, 2.067, 0.17432],
    [3, 3.068, 0.38403],
    [4, 4.026, 0.66131],
    [6, 6.065, 1.50079],
  ])('%d in: %d in inside, %d gal/ft', (nominalIn, insideIn, gallons) => {
    expect(insideDiameterIn(nominalIn)).toBeCloseTo(insideIn, 9);
    expect(gallonsPerFoot(nominalIn)).toBeCloseTo(gallons, 5);
    expect(gallonsPerFoot(nominalIn)).toBeCloseTo(0.0407999 * insideIn ** 2, 5); // US gallon of 231 in³
  });

  // Published gallons per 100 ft of schedule 40; they agree with this convention within 0.3 %.
  it.each<[NominalSizeIn, number]>([
    [2, 17.41],
    [3, 38.47],
    [4, 66.13],
    [6, 150.0],
  ])('%d in holds about %d gal in 100 ft', (nominalIn, gallons) => {
    expect(Math.abs((gallonsPerFoot(nominalIn) * 100) / gallons - 1)).toBeLessThan(0.003);
  });

  // Force on a plug, pressure × bore, computed for these bores and printed to two or three figures: half a percent is allowed.
  it.each<[NominalSizeIn, number, number]>([
    [2, 14.5, 43.6],
    [3, 32.0, 96.1],
    [4, 55.2, 165.5],
    [6, 125, 376],
  ])('a %d in plug bears %d lbf at 4.335 psi and %d at 13', (nominalIn, atTenFeet, atThirtyFeet) => {
    expect(Math.abs((boreAreaSqIn(nominalIn) * 4.335) / atTenFeet - 1)).toBeLessThan(0.005);
    expect(Math.abs((boreAreaSqIn(nominalIn) * 13) / atThirtyFeet - 1)).toBeLessThan(0.005);
  });

  it('knows the sizes it has and no others', () => {
    expect(nominalSizesIn.every(isNominalSize)).toBe(true);
    expect([0, 1, 5, 8, Number.NaN].some(isNominalSize)).toBe(false);
  });
});
