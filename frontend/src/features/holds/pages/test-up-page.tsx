import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { TaskHead } from '../../../components/task-head';
import { QueryState } from '../../../lib/query-state';
import { useLotLive } from '../../../lib/realtime';
import { lotQuery } from '../../lots/api/lot';
import { lotHoldsQuery } from '../../lots/api/lot-holds';
import { lotVisitsQuery } from '../../lots/api/lot-visits';
import { LotTests } from '../components/lot-tests';
import '../holds.css';

/** Put the test up: one lot, one system at a time. */
export function TestUpPage(): ReactNode {
  const { lotId = '' } = useParams();
  useLotLive(lotId);
  const lot = useQuery(lotQuery(lotId));
  const holds = useQuery(lotHoldsQuery(lotId));
  const visits = useQuery(lotVisitsQuery(lotId));
  return (
    <>
      {lot.data === undefined ? <BareHead lotId={lotId} /> : null}
      <QueryState query={lot}>
        {(detail) => (
          <QueryState query={holds}>
            {(tests) => (
              <QueryState query={visits}>
                {(known) => <LotTests lot={detail} holds={tests.items} visits={known.items} />}
              </QueryState>
            )}
          </QueryState>
        )}
      </QueryState>
    </>
  );
}

function BareHead({ lotId }: { lotId: string }): ReactNode {
  const { t } = useTranslation('holds');
  return <TaskHead backTo={`/lots/${lotId}`} label={t('page.label')} title={t('page.bareTitle')} />;
}
