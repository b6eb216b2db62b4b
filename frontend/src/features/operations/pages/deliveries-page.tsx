import { useInfiniteQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Head } from '../../../components/head';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { deliveriesQuery, type DeliveryFilter } from '../api/deliveries';
import { DeliveryTable } from '../components/delivery-table';
import '../operations.css';

/** Operator: what has not gone out, and sending it again. */
export function DeliveriesPage(): ReactNode {
  const { t } = useTranslation(['operations', 'common']);
  const [state, setState] = useState<DeliveryFilter>('waiting');
  const query = useInfiniteQuery(deliveriesQuery(state));
  const counts = query.data?.pages[0];
  return (
    <>
      <Head
        label={t('deliveries.label')}
        title={t('deliveries.title')}
        cells={[
          { label: t('deliveries.waiting'), value: counts?.waiting ?? '' },
          { label: t('deliveries.givenUp'), value: counts?.givenUp ?? '' },
        ]}
        acts={
          <Choice
            label={t('deliveries.filter')}
            options={[
              { value: 'waiting', label: t('deliveries.waiting') },
              { value: 'given-up', label: t('deliveries.givenUp') },
            ]}
            value={state}
            onChange={setState}
          />
        }
      />
      <QueryState query={query}>
        {({ pages }) => {
          const items = pages.flatMap((page) => page.items);
          const which = state === 'waiting' ? 'emptyWaiting' : 'emptyGivenUp';
          if (items.length > 0) return <DeliveryTable items={items} />;
          return (
            <Plain kind="empty" mark="sent" title={t(`deliveries.${which}Title`)}>
              {t(`deliveries.${which}Text`)}
            </Plain>
          );
        }}
      </QueryState>
      {query.hasNextPage ? (
        <div className="more-row">
          <Act busy={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
            {t('common.more')}
          </Act>
        </div>
      ) : null}
    </>
  );
}
