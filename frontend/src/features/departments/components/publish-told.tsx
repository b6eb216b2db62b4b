import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { ruleCardTouchesQuery } from '../api/rule-card-touches';

/** Before a rule card is published: who is told, what keeps its version, what cannot be taken back. */
export function PublishTold({ ruleCardId }: { ruleCardId: string }): ReactNode {
  const { t } = useTranslation('departments');
  const { data } = useQuery(ruleCardTouchesQuery(ruleCardId));
  return (
    <>
      <p>{t('publish.told')}</p>
      {data === undefined ? null : (
        <ul className="told-list">
          {data.told.map(({ organizationId, name, people }) => (
            <li key={organizationId}>{t('publish.toldOne', { name, count: people })}</li>
          ))}
          <li>
            {t('publish.kept', { count: data.keptVisits.booked + data.keptVisits.requested })}
            {data.unfitPlans.length > 0 ? ` ${t('publish.unfit', { count: data.unfitPlans.length })}` : ''}
          </li>
        </ul>
      )}
      <p>{t('publish.forGood')}</p>
    </>
  );
}
