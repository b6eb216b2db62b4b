import { convertLength, convertMass, convertPressure, convertTemperature, convertVolume } from './units.js';

/** Standard acceleration of free fall, m/s² (exact, CGPM 1901). */
const standardGravity = 9.80665;

/** Coefficients of Kell (1975), J. Chem. Eng. Data 20, 97: numerator in rising powers of °C, and the denominator's one. */
const kellNumerator = [999.83952, 16.945176, -7.9870401e-3, -46.170461e-6, 105.56302e-9, -280.54253e-12] as const;
const kellDenominator = 16.87985e-3;

/** Density of air-free water at standard pressure, kg/m³, from 32 to 212 °F, by Kell's formula. */
export function waterDensityKgM3(waterTempF: number): number {
  const celsius = convertTemperature(waterTempF, 'F', 'C');
  const numerator = kellNumerator.reduceRight((sum, coefficient) => sum * celsius + coefficient, 0);
  return numerator / (1 + kellDenominator * celsius);
}

/** Pressure under `headFt` feet of water, psi; a point above the water stands under none. */
export function headPsi(headFt: number, waterTempF: number): number {
  const heightM = convertLength(Math.max(0, headFt), 'ft', 'm');
  return convertPressure((waterDensityKgM3(waterTempF) * standardGravity * heightM) / 1000, 'kPa', 'psi');
}

/** Weight of `volumeGal` gallons of water, pounds. */
export function waterWeightLb(volumeGal: number, waterTempF: number): number {
  const cubicMetres = convertVolume(volumeGal, 'gal', 'L') / 1000;
  return convertMass(cubicMetres * waterDensityKgM3(waterTempF), 'kg', 'lb');
}
