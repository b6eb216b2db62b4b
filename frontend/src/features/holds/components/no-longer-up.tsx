import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { useNoLongerUp } from '../api/no-longer-up';

/** Takes "test up" back after one question that says who is told. */
export function NoLongerUp({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation('holds');
  const [isAsking, setIsAsking] = useState(false);
  const taking = useNoLongerUp(visit.lotId, () => {
    setIsAsking(false);
    sayDone({ mark: 'booked', title: t('down.done') });
  });
  const fault = useErrorWords(taking.error);
  return (
    <>
      <Act size="lg" onClick={() => setIsAsking(true)}>
        {t('down.act')}
      </Act>
      <Question
        isOpen={isAsking}
        title={t('down.title', { lot: visit.lotNumber })}
        keepWord={t('down.keep')}
        endWord={t('down.word')}
        busy={taking.isPending}
        error={fault === null ? undefined : `${fault.title}. ${fault.next}`}
        onKeep={() => setIsAsking(false)}
        onEnd={() => taking.mutate({ visitId: visit.id, expectedVersion: visit.version })}
      >
        {t('down.told', { builder: visit.builderName, inspector: visit.inspector?.name ?? visit.departmentName })}
      </Question>
    </>
  );
}
