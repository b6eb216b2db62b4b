import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { Act } from '../../../components/act';
import { TaskHead } from '../../../components/task-head';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { QueryState } from '../../../lib/query-state';
import { useLotLive } from '../../../lib/realtime';
import { lotQuery } from '../../lots/api/lot';
import { lotPlansQuery } from '../api/plans';
import { PlanSheet } from '../components/plan-sheet';
import '../plans.css';
import '../plan-print.css';
import '../gauge-tag.css';

/** How a house is put under test: the method chosen for each unit, stage and system, drawn on this very house. */
export function PlanPage(): ReactNode {
  const { lotId = '' } = useParams();
  const { t } = useTranslation(['plans', 'common']);
  useLotLive(lotId);
  const isPhone = useSheetWidth() === 'phone';
  const lot = useQuery(lotQuery(lotId));
  const plans = useQuery(lotPlansQuery(lotId));
  const cells =
    lot.data === undefined
      ? []
      : [
          { label: t('sheet.address'), value: lot.data.address },
          ...(lot.data.ruleCard === null
            ? []
            : [{ label: t('cardWord'), value: t('common.ruleCard', { version: lot.data.ruleCard.version }) }]),
        ];
  return (
    <div className="plan-page">
      <TaskHead
        backTo={`/lots/${lotId}`}
        label={t('label')}
        title={lot.data === undefined ? t('label') : t('common.lot', { number: lot.data.number })}
        cells={cells}
        right={isPhone ? undefined : <Act to={`/lots/${lotId}`}>{t('backToLot')}</Act>}
      />
      <QueryState query={lot}>
        {(detail) => <QueryState query={plans}>{({ items }) => <PlanSheet lot={detail} plans={items} />}</QueryState>}
      </QueryState>
    </div>
  );
}
