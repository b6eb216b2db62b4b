import {
  pressureRange,
  readLevel,
  readPressure,
  temperature,
  workedPressure,
  type Measure,
  type Units,
} from '../../lib/units';
import type { TestAnalysis } from './test-analysis';

/** How the numbers of one test are printed: never finer than its gauge or tape. */
export interface VerdictMeasures {
  /** As read: to half a mark. */
  readonly read: (value: number) => Measure;
  /** Worked out: to a whole mark; its words say "about". */
  readonly worked: (value: number) => Measure;
  /** Worked out and never less than was found: a mark up where it lies between two. */
  readonly up: (value: number) => Measure;
  readonly range: (low: number, high: number) => Measure;
  readonly temperature: (valueF: number) => Measure;
}

export function verdictMeasures(
  { isLevel, increment }: Pick<TestAnalysis, 'isLevel' | 'increment'>,
  units: Units,
): VerdictMeasures {
  const range = (low: number, high: number): Measure => pressureRange(low, high, increment, units);
  return {
    read: (value) => (isLevel ? readLevel(value, increment, units) : readPressure(value, increment, units)),
    // a level is read to half of what is given, so twice the mark is a whole one
    worked: (value) =>
      isLevel ? readLevel(value, 2 * increment, units) : plain(workedPressure(value, increment, units)),
    up: (value) => plain({ ...range(value, value), number: range(value, value).number.split('–').at(-1) ?? '' }),
    range,
    temperature: (valueF) => temperature(valueF, units),
  };
}

const plain = (measure: Measure): Measure => ({ ...measure, number: String(Number(measure.number)) });
