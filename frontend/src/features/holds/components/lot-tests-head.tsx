import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { TaskHead } from '../../../components/task-head';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';

export interface LotTestsHeadProps {
  lot: LotDetail;
  stage: Stage | null;
  visit: VisitSummary | null;
}

/** "Millpond, rough-in" over "Lot 52, put the test up". */
export function LotTestsHead({ lot, stage, visit }: LotTestsHeadProps): ReactNode {
  const { t } = useTranslation(['holds', 'common']);
  const locale = useLocale();
  const time = useTimeWords();
  const stageName = stage === null ? null : localName(stage.name, locale);
  const window =
    visit === null ? t('page.noWindow') : time.dayWindow(visit.window.startAt, visit.window.endAt, visit.zone);
  const isUp = visit?.state === 'ready';
  return (
    <TaskHead
      backTo={`/lots/${lot.id}`}
      label={[lot.tract?.name ?? lot.address, stageName].filter(Boolean).join(', ')}
      title={<Numeral text={t('page.title', { lot: lot.number })} />}
      right={isUp ? <StateWord state="ready" /> : undefined}
      cells={[
        { label: t('page.window'), value: <Numeral text={window} /> },
        ...(lot.zone === null ? [] : [{ label: t('page.zone'), value: time.zone(lot.zone) }]),
      ]}
    />
  );
}
