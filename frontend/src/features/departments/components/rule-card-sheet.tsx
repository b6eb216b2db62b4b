import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSearchParams } from 'react-router-dom';
import { Choice } from '../../../components/choice';
import { departmentQuery } from '../api/department';
import { ruleCardQuery } from '../api/rule-card';
import { DraftForm } from './draft-form';
import { RuleCardView } from './rule-card-view';

const modes = ['read', 'change'] as const;

/** The sheet of one version; the desk's draft can be read or changed. */
export function RuleCardSheet({ ruleCardId }: { ruleCardId: string }): ReactNode {
  const { t } = useTranslation('departments');
  const [search, setSearch] = useSearchParams();
  const card = useQuery(ruleCardQuery(ruleCardId));
  const departmentId = card.data?.departmentId ?? '';
  const isDraft = card.data?.state === 'draft';
  const department = useQuery({ ...departmentQuery(departmentId), enabled: isDraft });
  const mayChange = isDraft && department.data?.abilities.canEditRuleCards === true;
  const mode = mayChange && search.get('mode') === 'change' ? 'change' : 'read';
  const choose = (next: (typeof modes)[number]): void =>
    setSearch(
      (before) => {
        if (next === 'read') before.delete('mode');
        else before.set('mode', next);
        return before;
      },
      { replace: true },
    );
  return (
    <>
      {mayChange ? (
        <div className="compare-bar">
          <Choice
            label={t('mode.label')}
            options={modes.map((value) => ({ value, label: t(`mode.${value}`) }))}
            value={mode}
            onChange={choose}
          />
        </div>
      ) : null}
      {mode === 'change' && card.data ? (
        <DraftForm key={card.data.id} ruleCard={card.data} />
      ) : (
        <RuleCardView ruleCardId={ruleCardId} isPublic={false} />
      )}
    </>
  );
}
