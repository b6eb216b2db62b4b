import { convertLength, convertPressure } from '@holdwater/shared-types/hydraulics/units.js';
import type { Measure, Units } from '../../lib/units';

export type MeasureKind = 'length' | 'pressure';

/** A house is kept in feet and psi; this shows and reads it in the units its reader works in. */
export interface HouseMeasures {
  readonly units: Units;
  readonly unitOf: (kind: MeasureKind) => Measure['unit'];
  /** A stored measure in words to be typed over; empty for none. */
  readonly show: (stored: number | null | undefined, kind: MeasureKind) => string;
  /** What was typed, in feet or psi; null for nothing, NaN for what is no number. A comma is taken as the point. */
  readonly read: (words: string, kind: MeasureKind) => number | null;
}

const toMetric = {
  length: (feet: number) => convertLength(feet, 'ft', 'm'),
  pressure: (psi: number) => convertPressure(psi, 'psi', 'kPa'),
} as const;
const fromMetric = {
  length: (metres: number) => convertLength(metres, 'm', 'ft'),
  pressure: (kPa: number) => convertPressure(kPa, 'kPa', 'psi'),
} as const;
const unitWords = {
  us: { length: 'ft', pressure: 'psi' },
  metric: { length: 'm', pressure: 'kPa' },
} as const;

/** To a millimetre and a tenth of a kPa: finer than anybody measures a house. */
const shownPlaces = { length: 3, pressure: 1 } as const;
/** What is typed in metres or kPa is kept to so many places of a foot or psi, so that it is shown again as it was typed. */
const keptPlaces = 4;

const rounded = (value: number, places: number): number => Number(value.toFixed(places));

/** A count or anything else that has no unit. */
export function readNumber(words: string): number | null {
  const plain = words.trim().replace(',', '.');
  return plain === '' ? null : Number(plain);
}

/** In metric, what was shown and not typed over is read as it was stored: no house changes by being looked at. */
export function houseMeasures(units: Units): HouseMeasures {
  const stored = new Map<string, number>();
  const showMetric = (value: number, kind: MeasureKind): string => {
    const words = String(rounded(toMetric[kind](value), shownPlaces[kind]));
    const other = stored.get(`${kind} ${words}`);
    const shown = other === undefined || other === value ? words : String(toMetric[kind](value));
    stored.set(`${kind} ${shown}`, value);
    return shown;
  };
  return {
    units,
    unitOf: (kind) => unitWords[units][kind],
    show: (value, kind) => {
      if (value === null || value === undefined) return '';
      return units === 'us' ? String(value) : showMetric(value, kind);
    },
    read: (words, kind) => {
      const value = readNumber(words);
      if (value === null || units === 'us') return value;
      return stored.get(`${kind} ${words}`) ?? rounded(fromMetric[kind](value), keptPlaces);
    },
  };
}
