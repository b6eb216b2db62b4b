import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Panel } from '../../../components/panel';
import { useNow } from '../../../lib/clock';
import { localDateOf } from '../../../lib/local-days';
import { QueryState } from '../../../lib/query-state';
import { departmentQuery } from '../api/department';
import { ruleCardQuery } from '../api/rule-card';
import { ClosureForm } from './closure-form';
import { Closures } from './closures';
import { DraftPart } from './draft-part';
import { ReadAsPanel } from './read-as-panel';

export interface DepartmentDeskProps {
  departmentId: string;
  ruleCardId: string | null;
}

/** What stands beside a rule card for signed-in readers; acts by what the server lets this reader do. */
export function DepartmentDesk({ departmentId, ruleCardId }: DepartmentDeskProps): ReactNode {
  const { t } = useTranslation('departments');
  const now = useNow();
  const department = useQuery(departmentQuery(departmentId));
  const card = useQuery({ ...ruleCardQuery(ruleCardId ?? ''), enabled: ruleCardId !== null });
  return (
    <QueryState query={department}>
      {({ department: one, ruleCards, closures, abilities }) => {
        const today = localDateOf(now, one.zone);
        const draft = ruleCards.find(({ state }) => state === 'draft');
        return (
          <>
            {abilities.canEditRuleCards ? (
              <DraftPart
                departmentId={departmentId}
                draftId={draft?.id ?? null}
                isShown={draft !== undefined && draft.id === ruleCardId}
              />
            ) : null}
            {abilities.canEditRuleCards && card.data !== undefined ? <ReadAsPanel ruleCard={card.data} /> : null}
            <Panel title={t('closures.title')}>
              <Closures departmentId={departmentId} closures={closures} today={today} canClose={abilities.canClose} />
            </Panel>
            {abilities.canClose ? (
              <Panel title={t('closures.addTitle')} isQuiet>
                <ClosureForm departmentId={departmentId} today={today} />
              </Panel>
            ) : null}
          </>
        );
      }}
    </QueryState>
  );
}
