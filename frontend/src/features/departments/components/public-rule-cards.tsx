import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { QueryState } from '../../../lib/query-state';
import { departmentsQuery } from '../api/departments';
import { NoDepartments, NoRuleCard } from './no-rule-card';
import { RuleCardView } from './rule-card-view';
import { DepartmentList } from './version-list';

/** Rule cards for anyone: the departments, or one version without side columns. */
export function PublicRuleCards(): ReactNode {
  const { t } = useTranslation('departments');
  const { ruleCardId } = useParams();
  const [search] = useSearchParams();
  const departments = useQuery(departmentsQuery(true));
  return (
    <QueryState query={departments}>
      {({ items }) => {
        if (items.length === 0) return <NoDepartments />;
        // a department's own address leads to the version in force there
        const asked = ruleCardId ?? search.get('department');
        const department = items.find(({ id }) => id === asked);
        const shownId = department === undefined ? ruleCardId : department.ruleCard?.id;
        if (shownId === undefined && department !== undefined) return <NoRuleCard department={department} />;
        if (shownId === undefined) {
          return (
            <div className="public-rule-cards">
              <h1 className="h1 list-title">{t('list.title')}</h1>
              <DepartmentList departments={items} chosenId={null} />
              <p className="s mid list-foot">{t('list.anyone')}</p>
            </div>
          );
        }
        return (
          <div className="public-rule-cards">
            <RuleCardView ruleCardId={shownId} isPublic />
            <p className="panel-body">
              <Link to="/rule-cards">{t('list.all')}</Link>
            </p>
          </div>
        );
      }}
    </QueryState>
  );
}
