import { rankine } from './units.js';

const squareInchesPerSquareFoot = 144;
const cubicInchesPerGallon = 231;
const cubicInchesPerCubicFoot = 1728;

/** Atmospheric pressure in psi, absolute, at a height above sea level in feet: U.S. Standard Atmosphere 1976, lowest layer. */
export const atmospherePsi = (elevationFt: number): number => 14.6959 * (1 - 6.87559e-6 * elevationFt) ** 5.25588;

/**
 * What a gauge on shut-in air reads after it went from one temperature to another: P/T of the absolute values stays.
 * Gauge psi in and out, °F, `patmPsi` absolute.
 */
export const airGaugePsiAt = (psi: number, fromF: number, toF: number, patmPsi: number): number =>
  ((psi + patmPsi) * rankine(toF)) / rankine(fromF) - patmPsi;

/** Energy that shut-in air sets free when it expands to the atmosphere at one temperature, ft·lbf: P_abs · V · ln(P_abs / P_atm). */
export function storedEnergyFtLbf(psi: number, volumeGal: number, patmPsi: number): number {
  const absPsi = psi + patmPsi;
  const cubicFeet = (volumeGal * cubicInchesPerGallon) / cubicInchesPerCubicFoot;
  return absPsi * squareInchesPerSquareFoot * cubicFeet * Math.log(absPsi / patmPsi);
}
