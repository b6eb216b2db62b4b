import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import { useMemo } from 'react';
import { useMe } from '../../app/session';
import { measureWords, readLevel, readPressure, temperature, type Measure } from '../../lib/units';

/** Smallest marks taken where the test names none: never finer than common gauges and tapes (common practice, no published source). */
const usualMarks = { incrementPsi: 1, incrementIn: 0.25 } as const;

/** What a reading says, to half a mark of what it was read on; null where it says neither pressure nor level. */
export function measureOf(hold: Hold, reading: Reading, units: 'us' | 'metric'): Measure | null {
  const { pressurePsi, levelIn } = reading;
  if (pressurePsi !== null)
    return markedPressure(pressurePsi, hold.gauge?.incrementPsi ?? usualMarks.incrementPsi, units);
  if (levelIn !== null) return readLevel(levelIn, hold.tape?.incrementIn ?? usualMarks.incrementIn, units);
  return null;
}

/** A pressure to half a mark of its gauge: "112", "112.5". */
export function markedPressure(pressurePsi: number, incrementPsi: number | undefined, units: 'us' | 'metric'): Measure {
  return readPressure(pressurePsi, incrementPsi ?? usualMarks.incrementPsi, units);
}

/** Readings in the reader's own units. */
export function useReadingWords() {
  const { units } = useMe();
  return useMemo(
    () => ({
      units,
      measure: (hold: Hold, reading: Reading) => measureOf(hold, reading, units),
      value: (hold: Hold, reading: Reading): string | null => {
        const measure = measureOf(hold, reading, units);
        return measure === null ? null : measureWords(measure);
      },
      temperature: (reading: Reading) =>
        reading.temperatureF === null ? null : temperature(reading.temperatureF, units),
    }),
    [units],
  );
}
