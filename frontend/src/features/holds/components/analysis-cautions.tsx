import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Caution } from '../../../components/caution';
import { measureWords, temperature, type Units } from '../../../lib/units';
import type { TestAnalysis } from '../test-analysis';
import { verdictMeasures } from '../verdict-measures';

/** Cautions that the log or the window's weather raises; those of any pressure stand elsewhere. */
const raised = [
  'freeze',
  'freeze-risk',
  'sealed-water-warms',
  'water-temperature',
  'air-dissolves',
  'level-moves-with-temperature',
  'close-the-main',
  'temperature-missing',
  'many-top-ups',
] as const;

export function AnalysisCautions({ analysis, units = 'us' }: { analysis: TestAnalysis; units?: Units }): ReactNode {
  const { t } = useTranslation('holds');
  const measures = verdictMeasures(analysis, units);
  const numberOf = (value: unknown): number | null => (typeof value === 'number' ? value : null);
  return raised.map((code) => {
    const caution = analysis.cautions.find((one) => one.code === code);
    if (caution === undefined) return null;
    const { coldestF, ceilingPsi, temperatureF, topUps } = caution.params;
    const limit = numberOf(ceilingPsi);
    const degrees = (value: unknown): string => measureWords(temperature(numberOf(value) ?? 0, units));
    const isBare = code === 'sealed-water-warms' && limit === null;
    return (
      <Caution key={code}>
        {t(isBare ? 'verdict.cautions.sealed-water-warms-bare' : `verdict.cautions.${code}`, {
          coldest: degrees(coldestF),
          near: degrees(temperatureF),
          limit: limit === null ? '' : measureWords(measures.read(limit)),
          topUps: numberOf(topUps) ?? 0,
        })}
      </Caution>
    );
  });
}
