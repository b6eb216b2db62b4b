import type { ReactNode } from 'react';
import type { FoundAnalysis } from '../use-test-analysis';
import type { VerdictWords } from '../use-verdict-words';
import { AnalysisCautions } from './analysis-cautions';
import { ForecastScale } from './forecast-scale';
import { GaugeLine, TestVerdict } from './test-verdict';

export interface TestAnswerProps {
  found: FoundAnalysis;
  words: VerdictWords;
  zone: string;
  /** What is typed, or was read last, tells of the gauge only. */
  isValveShut: boolean;
}

/** The answer to a reading, worked out on this device; with the valve shut it speaks of the gauge alone. */
export function TestAnswer({ found, words, zone, isValveShut }: TestAnswerProps): ReactNode {
  if (isValveShut) {
    return words.gauge === null ? null : (
      <div className="test-verdict wash-none" role="status">
        <GaugeLine gauge={words.gauge} />
      </div>
    );
  }
  return (
    <>
      <TestVerdict words={words}>
        {words.kind === 'losing' || words.kind === 'settling' ? null : <ForecastScale found={found} zone={zone} />}
      </TestVerdict>
      <div className="panel-body cautions">
        <AnalysisCautions analysis={found.analysis} />
      </div>
    </>
  );
}
