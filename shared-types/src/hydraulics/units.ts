/**
 * Factors of NIST SP 811 (2008), appendix B.8: how many of the SI unit one of it is. psi, gallon, foot and pound are given to the digits of
 * their exact definitions; mercury and water are the conventional ones, not those at 32 °F, 39.2 °F or 60 °F.
 */
const pressurePa = {
  psi: 6894.757293168361,
  kPa: 1000,
  bar: 100_000,
  inHg: 3386.389,
  ftH2O: 2989.067,
  inH2O: 249.0889,
  mH2O: 9806.65,
} as const;
const lengthM = { ft: 0.3048, in: 0.0254, m: 1 } as const;
const volumeL = { gal: 3.785411784, L: 1 } as const;
const massKg = { lb: 0.45359237, kg: 1 } as const;

export type PressureUnit = keyof typeof pressurePa;
export type LengthUnit = keyof typeof lengthM;
export type VolumeUnit = keyof typeof volumeL;
export type MassUnit = keyof typeof massKg;
export type TemperatureUnit = 'F' | 'C';

const converter =
  <U extends string>(inSi: Readonly<Record<U, number>>) =>
  (value: number, from: U, to: U): number =>
    from === to ? value : (value * inSi[from]) / inSi[to];

export const convertPressure = converter<PressureUnit>(pressurePa);
export const convertLength = converter<LengthUnit>(lengthM);
export const convertVolume = converter<VolumeUnit>(volumeL);
export const convertMass = converter<MassUnit>(massKg);

/** °F and °C; both scales' zero and step are exact by definition. */
export function convertTemperature(value: number, from: TemperatureUnit, to: TemperatureUnit): number {
  if (from === to) return value;
  return from === 'F' ? ((value - 32) * 5) / 9 : (value * 9) / 5 + 32;
}

/** Absolute temperature in degrees Rankine (SP 811: °F + 459.67). */
export const rankine = (temperatureF: number): number => temperatureF + 459.67;
