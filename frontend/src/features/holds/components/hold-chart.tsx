import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { TestChart } from '../../../drawings/test-chart';
import type { TestChartData } from '../../../drawings/test-chart.types';
import { useNow } from '../../../lib/clock';
import { useTimeWords } from '../../../lib/time';
import { measureWords, type Measure, type Units } from '../../../lib/units';
import { testChartOf } from '../test-chart-of';
import type { FoundAnalysis } from '../use-test-analysis';
import { verdictMeasures, type VerdictMeasures } from '../verdict-measures';

/** The chart of one test, with its text in the reader's words and units. */
export function HoldChart({ found, zone, units }: { found: FoundAnalysis; zone: string; units: Units }): ReactNode {
  const now = useNow();
  const measures = verdictMeasures(found.analysis, units);
  const data = testChartOf(found);
  const read = (value: number): Measure => measures.read(Math.abs(value));
  const end = found.analysis.forecast?.from ?? null;
  const expected = end === null ? null : measures.range(end.low, end.high);
  return (
    <TestChart
      data={data}
      zone={zone}
      nowMs={now.getTime()}
      number={(value) => read(value).number}
      unit={read(0).unit}
      degrees={(valueF) => measures.temperature(valueF).number}
      degreesUnit={measures.temperature(0).unit}
      name={useChartName(data, measures, zone, expected)}
      expected={expected?.number ?? null}
    />
  );
}

function useChartName(data: TestChartData, measures: VerdictMeasures, zone: string, expected: Measure | null): string {
  const { t } = useTranslation('marks');
  const time = useTimeWords();
  const { points, minimum, window } = data;
  const [first, last] = [points[0], points.at(-1)];
  const words = (value: number): string => measureWords(measures.read(Math.abs(value)));
  const at = (point: { atMs: number; value: number }): string =>
    t('testChart.at', { value: words(point.value), time: time.dayClock(new Date(point.atMs), zone) });
  return [
    t('testChart.name', { count: points.length }),
    first === undefined || last === undefined ? '' : t('testChart.from', { first: at(first), last: at(last) }),
    minimum === null ? '' : t('testChart.minimumIs', { value: words(minimum) }),
    window === null || expected === null
      ? ''
      : t('testChart.window', {
          time: time.dayWindow(new Date(window.fromMs), new Date(window.toMs), zone),
          value: measureWords(expected),
        }),
  ]
    .filter(Boolean)
    .join('; ');
}
