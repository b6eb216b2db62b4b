import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { TaskHead } from '../../../components/task-head';
import { QueryState } from '../../../lib/query-state';
import { useLotLive } from '../../../lib/realtime';
import { ruleCardVersionQuery } from '../../holds/api/rule-card-version';
import { lotQuery } from '../../lots/api/lot';
import { lotCorrectionsQuery } from '../../lots/api/lot-corrections';
import { lotHoldsQuery } from '../../lots/api/lot-holds';
import { visitQuery } from '../../visits/api/visit';
import { VisitOutcome } from '../components/visit-outcome';
import '../outcomes.css';

/** While a start can be taken back the server is asked whether it still can. */
const undoAskedMs = 15_000;

/** The outcome of one visit: start it, answer, record; afterwards what was recorded. */
export function OutcomePage(): ReactNode {
  const { t } = useTranslation('outcomes');
  const { visitId = '' } = useParams();
  const visit = useQuery({
    ...visitQuery(visitId),
    refetchInterval: ({ state }) => (state.data?.moves.includes('undo-begin') ? undoAskedMs : false),
  });
  const lotId = visit.data?.lotId;
  useLotLive(lotId);
  const known = { enabled: lotId !== undefined };
  const lot = useQuery({ ...lotQuery(lotId ?? ''), ...known });
  const holds = useQuery({ ...lotHoldsQuery(lotId ?? ''), ...known });
  const corrections = useQuery({ ...lotCorrectionsQuery(lotId ?? ''), ...known });
  const ruleCard = useQuery(
    ruleCardVersionQuery(
      visit.data === undefined ? null : { departmentId: visit.data.departmentId, version: visit.data.ruleCardVersion },
    ),
  );
  const first = [visit, lot, holds, corrections, ruleCard].find(({ data }) => data === undefined);
  if (first !== undefined) {
    return (
      <>
        <TaskHead backTo="/run" label={t('page.label')} title={t('page.bareTitle')} />
        <QueryState<unknown> query={first}>{() => null}</QueryState>
      </>
    );
  }
  if (!visit.data || !lot.data || !holds.data || !corrections.data || !ruleCard.data) return null;
  return (
    <VisitOutcome
      visit={visit.data}
      lot={lot.data}
      holds={holds.data.items}
      corrections={corrections.data.items}
      ruleCard={ruleCard.data}
    />
  );
}
