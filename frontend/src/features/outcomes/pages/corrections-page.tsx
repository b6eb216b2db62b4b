import { correctionStates, type CorrectionState } from '@holdwater/shared-types/outcomes/correction.states.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSearchParams } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Head } from '../../../components/head';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { useOrganization } from '../../../lib/session-context';
import { correctionsQuery } from '../api/corrections';
import { CorrectionRow } from '../components/correction-row';
import { useLotZones } from '../use-lot-zones';
import '../outcomes.css';

/** Corrections of the organization's lots by state, what the reader can act on first. */
export function CorrectionsPage(): ReactNode {
  const { t } = useTranslation(['outcomes', 'common']);
  const [search, setSearch] = useSearchParams();
  const organization = useOrganization()?.organization;
  const state = correctionStates.find((one) => one === search.get('state')) ?? 'open';
  const query = useInfiniteQuery(correctionsQuery({ state, organizationId: organization?.id }));
  const items = query.data?.pages.flatMap((page) => page.items) ?? [];
  return (
    <>
      <Head
        label={t('list.label')}
        title={t('list.title')}
        cells={[
          {
            label: t('list.shown'),
            value: query.data === undefined ? '' : `${items.length}${query.hasNextPage ? '+' : ''}`,
          },
          { label: t('list.yours'), value: query.data === undefined ? '' : items.filter(isYours).length },
        ]}
      />
      <div className="panel-body list-filter">
        <Choice
          label={t('list.state')}
          options={correctionStates.map((value) => ({ value, label: t(`list.states.${value}`) }))}
          value={state}
          onChange={(next) => setSearch(next === 'open' ? {} : { state: next }, { replace: true })}
        />
      </div>
      <QueryState query={query}>{() => <CorrectionList items={items} state={state} />}</QueryState>
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

function isYours({ abilities }: Correction): boolean {
  return abilities.canFix || abilities.canDecide;
}

function CorrectionList({ items, state }: { items: readonly Correction[]; state: CorrectionState }): ReactNode {
  const { t } = useTranslation('outcomes');
  const zoneOfLot = useLotZones(items);
  const yours = items.filter(isYours);
  const others = items.filter((one) => !isYours(one));
  if (items.length === 0) {
    return (
      <Plain kind="empty" title={t(`list.empty.${state}`)}>
        {t('list.emptyText')}
      </Plain>
    );
  }
  return (
    <>
      {yours.length > 0 ? (
        <Group title={t('list.waitsOnYou', { count: yours.length })} items={yours} zoneOfLot={zoneOfLot} isOnYou />
      ) : null}
      {others.length > 0 ? <Group title={t(`list.others.${state}`)} items={others} zoneOfLot={zoneOfLot} /> : null}
    </>
  );
}

interface GroupProps {
  title: string;
  items: readonly Correction[];
  zoneOfLot: (lotId: string) => string | null;
  isOnYou?: boolean;
}

function Group({ title, items, zoneOfLot, isOnYou = false }: GroupProps): ReactNode {
  return (
    <section>
      <h2 className={isOnYou ? 'corrections-head h3 t-brass' : 'corrections-head h3'}>{title}</h2>
      <ul className="correction-list">
        {items.map((correction) => (
          <CorrectionRow key={correction.id} correction={correction} zone={zoneOfLot(correction.lotId)} />
        ))}
      </ul>
    </section>
  );
}
