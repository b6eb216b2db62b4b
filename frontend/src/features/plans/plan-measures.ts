import { convertMass, convertVolume } from '@holdwater/shared-types/hydraulics/units.js';
import type { Units } from '../../lib/units';

/** A number as printed and the unit behind it. */
export interface PlanMeasure {
  readonly number: string;
  readonly unit: string;
}

/** NIST SP 811 (2008), appendix B.8: pound-force to newton, foot pound-force to joule. */
const newtonPerLbf = 4.448222;
const joulePerFtLbf = 1.355818;

/** Numbers of a plan are no finer than the pipes are known: whole gallons, or the next coarser step of litres. */
export function volume(gallons: number, units: Units): PlanMeasure {
  if (units === 'us') return { number: String(Math.round(gallons)), unit: 'gal' };
  return { number: String(5 * Math.round(convertVolume(gallons, 'gal', 'L') / 5)), unit: 'L' };
}

/** Weight to ten pounds, or five kilograms. */
export function weight(pounds: number, units: Units): PlanMeasure {
  if (units === 'us') return { number: String(10 * Math.round(pounds / 10)), unit: 'lb' };
  return { number: String(5 * Math.round(convertMass(pounds, 'lb', 'kg') / 5)), unit: 'kg' };
}

/** A force on a plug, never told smaller than it is: up to the next ten pounds, or fifty newtons. */
export function force(poundsForce: number, units: Units): PlanMeasure {
  if (units === 'us') return { number: String(10 * Math.ceil(poundsForce / 10)), unit: 'lb' };
  return { number: String(50 * Math.ceil((poundsForce * newtonPerLbf) / 50)), unit: 'N' };
}

/** Stored energy to two figures, never told smaller than it is. */
export function energy(footPounds: number, units: Units): PlanMeasure {
  const value = units === 'us' ? footPounds : footPounds * joulePerFtLbf;
  const step = value <= 0 ? 1 : 10 ** Math.max(0, Math.floor(Math.log10(value)) - 1);
  return { number: (step * Math.ceil(value / step)).toLocaleString('en-US'), unit: units === 'us' ? 'ft·lb' : 'J' };
}

/** "56 gal". */
export const planMeasureWords = ({ number, unit }: PlanMeasure): string => `${number} ${unit}`;
