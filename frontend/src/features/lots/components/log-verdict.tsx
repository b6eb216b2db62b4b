import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { useNow } from '../../../lib/clock';
import { AnalysisCautions } from '../../holds/components/analysis-cautions';
import { HoldChart } from '../../holds/components/hold-chart';
import { TestVerdict } from '../../holds/components/test-verdict';
import { useVerdictWords } from '../../holds/use-verdict-words';
import type { LotAnalysis } from '../use-lot-analysis';

export interface LogVerdictProps {
  analysis: LotAnalysis;
  hold: Hold;
  zone: string;
}

/** Over the log: what it says, and its chart. A test that ended is drawn and no longer judged; over the limit the section says it alone. */
export function LogVerdict({ analysis, hold, zone }: LogVerdictProps): ReactNode {
  const { t } = useTranslation('lots');
  const { units } = useMe();
  const now = useNow();
  const wordsOf = useVerdictWords();
  const { found, isVerdictHeld } = analysis;
  const words = wordsOf({ ...found, zone, units, now });
  const isJudged = hold.state === 'standing' && !isVerdictHeld && words.kind !== 'over';
  return (
    <div className="log-verdict">
      {isJudged ? <TestVerdict words={words} /> : null}
      {isJudged ? (
        <div className="log-cautions">
          <AnalysisCautions analysis={found.analysis} units={units} />
        </div>
      ) : null}
      {isVerdictHeld ? <p className="s mid held">{t('log.judging')}</p> : null}
      <div className="log-chart">
        <HoldChart found={found} zone={zone} units={units} />
      </div>
    </div>
  );
}
