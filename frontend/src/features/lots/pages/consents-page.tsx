import type { ConsentRequest } from '@holdwater/shared-types/lots/lot.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Head, PhoneHead } from '../../../components/head';
import { Plain } from '../../../components/plain';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { QueryState } from '../../../lib/query-state';
import { consentsQuery } from '../api/consents';
import { ConsentGroup } from '../components/consent-group';
import { HandoverRequest } from '../components/handover-request';
import '../lots.css';

/** Lots that ask an organization of the reader to join, answered several at once; those to be taken over from another one by one. */
export function ConsentsPage(): ReactNode {
  const { t } = useTranslation('lots');
  const isPhone = useSheetWidth() === 'phone';
  const consents = useQuery(consentsQuery());
  const count = consents.data?.items.length ?? '';
  return (
    <>
      {isPhone ? (
        <PhoneHead label={t('head.label')} title={t('consents.title')} right={<span className="n">{count}</span>} />
      ) : (
        <Head
          label={t('head.label')}
          title={t('consents.title')}
          cells={[{ label: t('consents.count'), value: count }]}
        />
      )}
      <QueryState query={consents}>
        {({ items }) =>
          items.length === 0 ? (
            <Plain kind="empty" title={t('consents.emptyTitle')} acts={<Act to="/lots">{t('form.toLots')}</Act>}>
              {t('consents.emptyText')}
            </Plain>
          ) : (
            <>
              {items.map((item) =>
                item.handover ? (
                  <HandoverRequest key={`${item.lotId} ${item.organization.id}`} item={item} {...item.handover} />
                ) : null,
              )}
              {byOrganization(items.filter(({ handover }) => !handover)).map((group) => (
                <ConsentGroup key={group[0]?.organization.id} items={group} />
              ))}
            </>
          )
        }
      </QueryState>
    </>
  );
}

/** One answer is given for one organization. */
function byOrganization(items: readonly ConsentRequest[]): ConsentRequest[][] {
  const groups = new Map<string, ConsentRequest[]>();
  for (const item of items) groups.set(item.organization.id, [...(groups.get(item.organization.id) ?? []), item]);
  return [...groups.values()];
}
