import type { Department } from '@holdwater/shared-types/departments/departments.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams, useSearchParams } from 'react-router-dom';
import { useSession } from '../../../app/session';
import { QueryState } from '../../../lib/query-state';
import { departmentsQuery } from '../api/departments';
import { ruleCardQuery } from '../api/rule-card';
import { useReadingAs } from '../use-reading-as';
import { DepartmentDesk } from './department-desk';
import { DepartmentVersions } from './department-versions';
import { NoDepartments, NoRuleCard } from './no-rule-card';
import { ReadAsOther } from './read-as-other';
import { RuleCardSheet } from './rule-card-sheet';
import { DepartmentList } from './version-list';

/** Rule cards for signed-in readers: versions and departments at the left, the sheet, the desk's acts at the right. */
export function RuleCardDesk(): ReactNode {
  const departments = useQuery(departmentsQuery(false));
  return (
    <QueryState query={departments}>
      {({ items }) => (items.length === 0 ? <NoDepartments /> : <Columns departments={items} />)}
    </QueryState>
  );
}

function Columns({ departments }: { departments: readonly Department[] }): ReactNode {
  const { t } = useTranslation('departments');
  const { chosen, shownId } = useShown(departments);
  const [reader] = useReadingAs();
  if (reader === 'public' && shownId !== null) {
    return (
      <div className="public-rule-cards">
        <ReadAsOther ruleCardId={shownId} inForceId={chosen?.ruleCard?.id ?? null} reader={reader} />
      </div>
    );
  }
  return (
    <div className="rule-cards">
      <nav className="rule-cards-list" aria-label={t('list.name')}>
        {chosen ? <DepartmentVersions departmentId={chosen.id} ruleCardId={shownId} /> : null}
        <h2 className="h2 list-title">{t('list.others')}</h2>
        <DepartmentList departments={departments.filter(({ id }) => id !== chosen?.id)} chosenId={null} />
        <p className="s mid list-foot">{t('list.anyone')}</p>
      </nav>
      <div className="rule-cards-sheet">
        {shownId === null ? (
          <NoRuleCard department={chosen} />
        ) : reader === 'plumber' ? (
          <ReadAsOther ruleCardId={shownId} inForceId={chosen?.ruleCard?.id ?? null} reader={reader} />
        ) : (
          <RuleCardSheet ruleCardId={shownId} />
        )}
      </div>
      {chosen && reader === 'desk' ? (
        <aside className="rule-cards-desk" aria-label={t('desk')}>
          <DepartmentDesk departmentId={chosen.id} ruleCardId={shownId} />
        </aside>
      ) : null}
    </div>
  );
}

/** Which department and version the address names: a version, a department, or by default the reader's own or the first. */
function useShown(departments: readonly Department[]): { chosen: Department | undefined; shownId: string | null } {
  const { ruleCardId } = useParams();
  const [search] = useSearchParams();
  const own = useSession().chosen?.organization;
  const named = departments.find(({ id }) => id === ruleCardId);
  const card = useQuery({
    ...ruleCardQuery(ruleCardId ?? ''),
    enabled: ruleCardId !== undefined && named === undefined,
  });
  if (named !== undefined) return { chosen: named, shownId: named.ruleCard?.id ?? null };
  const chosenId = card.data?.departmentId ?? search.get('department') ?? own?.id ?? null;
  const fallback = ruleCardId === undefined ? departments[0] : undefined;
  const chosen = departments.find(({ id }) => id === chosenId) ?? fallback;
  return { chosen, shownId: ruleCardId ?? chosen?.ruleCard?.id ?? null };
}
