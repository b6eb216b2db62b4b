import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { TestChartScale } from '../../../drawings/test-chart-scale';
import { useTimeWords } from '../../../lib/time';
import { measureWords } from '../../../lib/units';
import type { FoundAnalysis } from '../use-test-analysis';
import { decidingEnd } from '../verdict';
import { verdictMeasures } from '../verdict-measures';

/** The little scale under the answer: where it will stand at the window, the minimum, and what to pump to. */
export function ForecastScale({ found, zone }: { found: FoundAnalysis; zone: string }): ReactNode {
  const { t } = useTranslation('holds');
  const time = useTimeWords();
  const { analysis, terms } = found;
  const end = terms.forecast && decidingEnd(analysis, terms.forecast);
  if (end === null || analysis.minimumPsi === null) return null;
  const measures = verdictMeasures(analysis, 'us');
  const topUpTo = analysis.forecast?.topUpTo ?? null;
  const said = {
    time: time.clock(end.at, zone),
    psi: measureWords(measures.worked(end.mid)),
    range: measures.range(end.low, end.high).number,
    minimum: measures.read(analysis.minimumPsi).number,
  };
  return (
    <TestChartScale
      {...{ low: end.low, mid: end.mid, high: end.high, pumpTo: topUpTo }}
      minimum={analysis.minimumPsi}
      increment={analysis.increment}
      name={
        topUpTo === null ? t('scale.name', said) : t('scale.nameWithPump', { ...said, to: measures.up(topUpTo).number })
      }
      atWord={t('scale.at', { time: said.time })}
      pumpWord={t('scale.pump')}
    />
  );
}
