import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { verifyLedger } from '@holdwater/shared-types/operations/operations.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Head } from '../../../components/head';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { ledgerCheckQuery } from '../api/ledger-check';

type Verdict = RouteAnswer<typeof verifyLedger>;

const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** Operator: every chain of the ledger recomputed, and the first entry of each that does not fit. */
export function LedgerPage(): ReactNode {
  const { t } = useTranslation('operations');
  const words = useTimeWords();
  const check = useQuery(ledgerCheckQuery);
  const checkedAt = check.dataUpdatedAt === 0 ? '' : words.clock(new Date(check.dataUpdatedAt), zone);
  return (
    <>
      <Head
        label={t('ledger.label')}
        title={t('ledger.title')}
        cells={[
          { label: t('ledger.chains'), value: check.data?.chains ?? '' },
          { label: t('ledger.entries'), value: check.data?.entries ?? '' },
          { label: t('ledger.anchors'), value: check.data?.anchors.days ?? '' },
          { label: t('ledger.checked'), value: checkedAt },
        ]}
        acts={
          <Act busy={check.isFetching} onClick={() => void check.refetch()}>
            {t('ledger.act')}
          </Act>
        }
      />
      <QueryState query={check}>{(verdict) => <LedgerVerdict verdict={verdict} />}</QueryState>
    </>
  );
}

function LedgerVerdict({ verdict }: { verdict: Verdict }): ReactNode {
  const { t } = useTranslation('operations');
  const words = useTimeWords();
  if (verdict.entries === 0) {
    return (
      <Plain kind="empty" title={t('ledger.emptyTitle')}>
        {t('ledger.emptyText')}
      </Plain>
    );
  }
  if (verdict.anchors.firstBroken !== null) {
    return (
      <>
        <Plain kind="error" title={t('ledger.anchorBrokenTitle')}>
          {t('ledger.anchorBrokenText', { day: words.dateYear(verdict.anchors.firstBroken) })}
        </Plain>
        <BrokenChains verdict={verdict} />
      </>
    );
  }
  if (verdict.broken.length === 0) {
    return (
      <Plain kind="empty" mark="sent" title={t('ledger.whole')}>
        {t('ledger.wholeText', { entries: verdict.entries })}
      </Plain>
    );
  }
  return <BrokenChains verdict={verdict} />;
}

function BrokenChains({ verdict }: { verdict: Verdict }): ReactNode {
  const { t } = useTranslation('operations');
  if (verdict.broken.length === 0) return null;
  return (
    <>
      <Plain kind="error" title={t('ledger.brokenTitle', { count: verdict.broken.length })}>
        {t('ledger.brokenText')}
      </Plain>
      <table className="ruled">
        <thead>
          <tr>
            <th scope="col">{t('ledger.scope')}</th>
            <th scope="col">{t('ledger.firstBroken')}</th>
          </tr>
        </thead>
        <tbody>
          {verdict.broken.map((chain) => (
            <tr key={chain.scope}>
              <th scope="row">{chain.scope}</th>
              <td data-label={t('ledger.firstBroken')} className="n">
                {chain.firstBroken}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
