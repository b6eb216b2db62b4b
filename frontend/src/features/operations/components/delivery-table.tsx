import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { listDeliveries } from '@holdwater/shared-types/operations/operations.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { StateWord } from '../../../components/state-word';
import { useErrorWords } from '../../../lib/errors';
import { useTimeWords } from '../../../lib/time';
import { useRetryDelivery } from '../api/retry-delivery';

export type Delivery = RouteAnswer<typeof listDeliveries>['items'][number];

/** The operator's own clock: deliveries belong to no department. */
const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** Messages that have not gone out, with what the other side answered last. */
export function DeliveryTable({ items }: { items: readonly Delivery[] }): ReactNode {
  const { t } = useTranslation('operations');
  return (
    <table className="ruled">
      <thead>
        <tr>
          <th scope="col">{t('deliveries.to')}</th>
          <th scope="col">{t('deliveries.kind')}</th>
          <th scope="col">{t('deliveries.state')}</th>
          <th scope="col">{t('deliveries.attempts')}</th>
          <th scope="col">{t('deliveries.nextAt')}</th>
          <th scope="col">{t('deliveries.lastError')}</th>
          <td />
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <DeliveryRow key={item.id} item={item} />
        ))}
      </tbody>
    </table>
  );
}

function DeliveryRow({ item }: { item: Delivery }): ReactNode {
  const { t, i18n } = useTranslation(['operations', 'notices']);
  const words = useTimeWords();
  const isGivenUp = item.state === 'given-up';
  const noticeKey = `notices.kinds.${item.kind}`;
  return (
    <tr>
      <th scope="row">{item.to}</th>
      {/* Mail of an account has no notice and goes by its code. */}
      <td data-label={t('deliveries.kind')}>{i18n.exists(noticeKey) ? t(noticeKey) : item.kind}</td>
      <td>
        <StateWord state={isGivenUp ? 'past-time' : 'sending'} word={t(`deliveries.states.${item.state}`)} />
      </td>
      <td data-label={t('deliveries.attempts')} className="n">
        {item.attempts}
      </td>
      <td data-label={t('deliveries.nextAt')}>
        {item.nextAttemptAt === null || isGivenUp ? '' : words.dayClock(item.nextAttemptAt, zone)}
      </td>
      <td data-label={t('deliveries.lastError')} className="s mid last-answer">
        {item.lastError}
      </td>
      <td className="acts-cell">{isGivenUp ? <RetryAct item={item} /> : null}</td>
    </tr>
  );
}

function RetryAct({ item }: { item: Delivery }): ReactNode {
  const { t } = useTranslation('operations');
  const retrying = useRetryDelivery();
  const words = useErrorWords(retrying.error);
  const retry = (): void =>
    retrying.mutate(item.id, {
      onSuccess: () => sayDone({ mark: 'sending', title: t('deliveries.retried', { to: item.to }) }),
    });
  return (
    <>
      <Act size="sm" busy={retrying.isPending} aria-label={t('deliveries.retryOf', { to: item.to })} onClick={retry}>
        {t('deliveries.retry')}
      </Act>
      {words === null ? null : (
        <p className="field-error" role="alert">
          {words.title}. {words.next}
        </p>
      )}
    </>
  );
}
