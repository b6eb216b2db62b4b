import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { sayDone } from '../../../components/done-line';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useEndHold, type HoldEnd } from '../api/end-hold';

export interface EndTestProps {
  lotId: string;
  hold: Hold;
  /** "Water, test 2" */
  name: string;
  /** The tests were said to be up for a visit: its people are told. */
  isUp: boolean;
}

/** Ends a test, with its reason, after one question. */
export function EndTest({ lotId, hold, name, isUp }: EndTestProps): ReactNode {
  const { t } = useTranslation('holds');
  const [isAsking, setIsAsking] = useState(false);
  const [reason, setReason] = useState<HoldEnd['reason']>('taken-down');
  const ending = useEndHold(lotId, (_, end) => {
    setIsAsking(false);
    sayDone({ mark: 'test-ended', title: t('end.done', { name }), text: t(`end.reasons.${end.reason}`) });
  });
  const fault = useErrorWords(ending.error);
  return (
    <>
      <Act kind="text" size="sm" onClick={() => setIsAsking(true)}>
        {t('end.act', { name })}
      </Act>
      <Question
        isOpen={isAsking}
        title={t('end.title', { name })}
        keepWord={t('end.keep')}
        endWord={t('end.word')}
        busy={ending.isPending}
        error={fault === null ? undefined : `${fault.title}. ${fault.next}`}
        onKeep={() => setIsAsking(false)}
        onEnd={() => ending.mutate({ holdId: hold.id, reason })}
      >
        <p>{t(isUp ? 'end.toldUp' : 'end.told')}</p>
        <Choice
          label={t('end.reason')}
          stacked
          wide
          options={(['taken-down', 'lost'] as const).map((value) => ({ value, label: t(`end.reasons.${value}`) }))}
          value={reason}
          onChange={setReason}
        />
      </Question>
    </>
  );
}
