/**
 * Constants and formulas, written out here from their sources and sharing nothing with the code under test. Exact by definition unless a
 * line says otherwise: NIST SP 811 (2008), appendix B.8, prints these factors to seven digits.
 */
export const metersPerFoot = 0.3048;
export const metersPerInch = 0.0254;
/** One pound-force (0.45359237 kg times 9.80665 m/s²) on a square inch. */
export const pascalsPerPsi = (0.45359237 * 9.80665) / metersPerInch ** 2;
export const kilogramsPerPound = 0.45359237;
/** The US gallon is 231 cubic inches. */
export const cubicInchesPerGallon = 231;
const standardGravity = 9.80665;

/** Density of water, kg/m³, of 0 to 100 °C. Kell, J. Chem. Eng. Data 20 (1975) 97, equation 16; coefficients from memory. */
export function densityOfWater(temperatureF: number): number {
  const t = (temperatureF - 32) / 1.8;
  const over =
    999.83952 +
    16.945176 * t -
    7.9870401e-3 * t ** 2 -
    46.170461e-6 * t ** 3 +
    105.56302e-9 * t ** 4 -
    280.54253e-12 * t ** 5;
  return over / (1 + 16.87985e-3 * t);
}

/** Pressure of a column of water in psi; a column of less than nothing presses nothing. */
export function columnPsi(heightFt: number, temperatureF: number): number {
  if (heightFt <= 0) return 0;
  return (densityOfWater(temperatureF) * standardGravity * heightFt * metersPerFoot) / pascalsPerPsi;
}

/** U.S. Standard Atmosphere 1976, troposphere, with the constants the design pins; psi absolute. */
export function atmospherePsi(elevationFt: number): number {
  return 14.6959 * (1 - 6.87559e-6 * elevationFt) ** 5.25588;
}

export const rankine = (temperatureF: number) => temperatureF + 459.67;

/** Work in air let out at one temperature, ft·lbf: absolute pressure × volume × ln(absolute pressure ÷ atmosphere). */
export function airEnergyFtLbf(gaugePsi: number, gallons: number, elevationFt: number): number {
  const atmosphere = atmospherePsi(elevationFt);
  const poundsPerSquareFoot = (gaugePsi + atmosphere) * 144;
  const cubicFeet = (gallons * cubicInchesPerGallon) / 1728;
  return poundsPerSquareFoot * cubicFeet * Math.log((gaugePsi + atmosphere) / atmosphere);
}

/** Outside diameter and wall in inches: ASTM D1785 and D2661/D2665 schedule 40, the same for PVC and ABS. */
const schedule40: ReadonlyMap<number, readonly [outside: number, wall: number]> = new Map([
  [1.25, [1.66, 0.14]],
  [1.5, [1.9, 0.145]],
  [2, [2.375, 0.154]],
  [3, [3.5, 0.216]],
  [4, [4.5, 0.237]],
  [6, [6.625, 0.28]],
]);
export const nominalSizes = [...schedule40.keys()];

/** Area of the bore of schedule 40 pipe, in². */
export function boreIn2(nominalIn: number): number {
  const [outside, wall] = schedule40.get(nominalIn) ?? [];
  if (outside === undefined || wall === undefined) throw new Error(`no schedule 40 pipe of ${nominalIn} in`);
  return (Math.PI / 4) * (outside - 2 * wall) ** 2;
}

export const gallonsPerFoot = (nominalIn: number) => (boreIn2(nominalIn) * 12) / cubicInchesPerGallon;

/** What the design lets comparisons be off by. */
const slack = 1e-9;
export const isAbove = (a: number, b: number) => a > b + slack;
export const upTo = (value: number, step: number) => Math.ceil(value / step - slack) * step;
export const downTo = (value: number, step: number) => Math.floor(value / step + slack) * step;
