import type { Department } from '@holdwater/shared-types/departments/departments.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams, useSearchParams } from 'react-router-dom';
import { useSession } from '../../../app/session';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { departmentsQuery } from '../api/departments';
import { ruleCardQuery } from '../api/rule-card';
import { DepartmentDesk } from '../components/department-desk';
import { RuleCardView } from '../components/rule-card-view';
import { DepartmentList } from '../components/version-list';
import '../departments.css';

/** The rule cards: the departments, and one version read through; for anyone, and with the desk's acts for the desk. */
export function RuleCardPage(): ReactNode {
  const { state } = useSession();
  // Before it is known who reads, the public answer would be shown first and then replaced.
  if (state.kind === 'starting') return <Lines />;
  return <RuleCards isPublic={state.kind !== 'signed-in'} />;
}

function RuleCards({ isPublic }: { isPublic: boolean }): ReactNode {
  const { t } = useTranslation('departments');
  const { ruleCardId } = useParams();
  const [search] = useSearchParams();
  const departments = useQuery(departmentsQuery(isPublic));
  const own = useSession().chosen?.organization;
  const card = useQuery({ ...ruleCardQuery(ruleCardId ?? '', isPublic), enabled: ruleCardId !== undefined });
  return (
    <QueryState query={departments}>
      {({ items }) => {
        if (items.length === 0) return <NoDepartments />;
        const chosenId = card.data?.departmentId ?? search.get('department') ?? own?.id ?? null;
        const chosen = items.find(({ id }) => id === chosenId) ?? (ruleCardId === undefined ? items[0] : undefined);
        const shownId = ruleCardId ?? chosen?.ruleCard?.id ?? null;
        return (
          <div className="rule-cards">
            <nav className="rule-cards-list" aria-label={t('list.name')}>
              {!isPublic && chosen ? (
                <DepartmentDesk departmentId={chosen.id} part="versions" ruleCardId={shownId} />
              ) : null}
              <h2 className="h2 list-title">{t(isPublic ? 'list.departments' : 'list.others')}</h2>
              <DepartmentList
                departments={isPublic ? items : items.filter(({ id }) => id !== chosen?.id)}
                chosenId={chosen?.id ?? null}
              />
              <p className="s mid list-foot">{t('list.anyone')}</p>
            </nav>
            <div className="rule-cards-sheet">
              <Shown ruleCardId={shownId} department={chosen} isPublic={isPublic} />
            </div>
            {!isPublic && chosen ? (
              <aside className="rule-cards-desk" aria-label={t('desk')}>
                <DepartmentDesk departmentId={chosen.id} part="acts" ruleCardId={shownId} />
              </aside>
            ) : null}
          </div>
        );
      }}
    </QueryState>
  );
}

function Shown(props: { ruleCardId: string | null; department: Department | undefined; isPublic: boolean }): ReactNode {
  const { t } = useTranslation('departments');
  const { ruleCardId, department, isPublic } = props;
  if (ruleCardId !== null) return <RuleCardView ruleCardId={ruleCardId} isPublic={isPublic} />;
  return (
    <Plain kind="empty" level={1} title={t('noCard.title', { department: department?.name ?? '' })}>
      {t(department?.isOutside ? 'noCard.outside' : 'noCard.text')} {department?.phone ?? ''}
    </Plain>
  );
}

function NoDepartments(): ReactNode {
  const { t } = useTranslation('departments');
  return (
    <Plain kind="empty" level={1} title={t('noneTitle')}>
      {t('noneText')}
    </Plain>
  );
}
