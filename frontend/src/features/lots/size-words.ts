import type { NominalSizeIn, WaterSizeIn } from '@holdwater/shared-types/hydraulics/pipes.js';
import type { Units } from '../../lib/units';

type Size = NominalSizeIn | WaterSizeIn;

const inches: Readonly<Record<Size, string>> = {
  0.375: '3/8',
  0.5: '1/2',
  0.75: '3/4',
  1: '1',
  1.25: '1 1/4',
  1.5: '1 1/2',
  2: '2',
  3: '3',
  4: '4',
  6: '6',
};

/** Metric nominal diameters of the same pipe, ISO 6708; from memory. */
const nominalDiameters: Readonly<Record<Size, number>> = {
  ...{ 0.375: 10, 0.5: 15, 0.75: 20, 1: 25, 1.25: 32, 1.5: 40, 2: 50, 3: 80, 4: 100, 6: 150 },
};

/** A size as the trade says it: pipe is made in inches, so metric readers see both. */
export function sizeWords(units: Units): (size: Size) => string {
  return (size) => (units === 'us' ? `${inches[size]} in` : `DN ${nominalDiameters[size]} (${inches[size]} in)`);
}
