import { height, workedPressure, type Units } from '../lib/units';

/** How a section tells its lengths and pressures. */
export interface CutawayUnits {
  readonly lengthUnit: string;
  readonly pressureUnit: string;
  /** Feet to 0.1 ft, or to 0.1 m. */
  readonly length: (feet: number) => string;
  /** psi to 0.1 psi, or to a whole kPa, which is coarser. */
  readonly pressure: (psi: number) => string;
  /** Feet between the marks of the rule. */
  readonly markFt: number;
}

const finestPsi = 0.1;

/** US customary, or metric by choice. */
export function cutawayUnits(units: Units): CutawayUnits {
  return {
    lengthUnit: height(0, units).unit,
    pressureUnit: workedPressure(0, finestPsi, units).unit,
    length: (feet) => height(feet, units).number,
    pressure: (psi) => workedPressure(psi, finestPsi, units).number,
    // NIST SP 811: a foot is 0.3048 m
    markFt: units === 'us' ? 1 : 1 / 0.3048,
  };
}
