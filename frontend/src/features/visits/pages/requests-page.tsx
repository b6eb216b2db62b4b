import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Head, PhoneHead } from '../../../components/head';
import { Lines } from '../../../components/lines';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { useNow } from '../../../lib/clock';
import { QueryState } from '../../../lib/query-state';
import { useCoversDates, useShownDate } from '../../../lib/shown-date';
import { useTimeWords } from '../../../lib/time';
import { useIsPhone } from '../../../lib/use-media';
import { requestsQuery } from '../api/requests';
import { useCalendarAddress } from '../calendar-address';
import { NoDepartment } from '../components/no-department';
import { RequestsList } from '../components/requests-list';
import { StaleStrip } from '../components/stale-strip';
import { VisitPanel } from '../components/visit-panel';
import { useOwnDepartment } from '../use-own-department';
import '../side-panel.css';

/** The desk's requests: placed one by one, on the day they want or on another of the ribbon. */
export function RequestsPage(): ReactNode {
  const department = useOwnDepartment();
  return department === null ? <NoDepartment /> : <Requests key={department.id} department={department} />;
}

function Requests({ department }: { department: { id: string; name: string } }): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const isPhone = useIsPhone();
  const now = useNow();
  const { panel, openVisit, close } = useCalendarAddress();
  const [shownDate] = useShownDate();
  const query = useQuery(requestsQuery(department.id));
  const items = query.data?.items ?? [];
  const picked = panel.kind === 'visit' ? panel.visitId : null;
  const wishedDate = items.find(({ id }) => id === picked)?.window.date ?? null;
  const date = shownDate ?? wishedDate;
  useCoversDates(picked === null ? null : date, picked === null ? null : date);
  const oldest = items.reduce<string | null>(
    (at, { requestedAt }) => (at === null || requestedAt < at ? requestedAt : at),
    null,
  );
  const zone = items[0]?.zone;
  const side =
    picked === null ? null : <VisitPanel key={picked} visitId={picked} placeDate={date ?? undefined} onClose={close} />;
  if (isPhone && side !== null) return side;
  return (
    <div className={side === null ? '' : 'with-side'}>
      <div className="side-main">
        {isPhone ? (
          <PhoneHead label={department.name} title={t('requests.title')} />
        ) : (
          <Head
            label={department.name}
            title={t('requests.title')}
            cells={[
              { label: t('requests.toPlace'), value: <Numeral text={items.length} /> },
              ...(oldest === null || zone === undefined
                ? []
                : [{ label: t('requests.oldest'), value: <Numeral text={words.dayClock(oldest, zone)} /> }]),
              ...(zone === undefined ? [] : [{ label: t('cal.zone'), value: words.zone(zone, now) }]),
            ]}
            acts={<Act to="/calendar?request=">{t('requests.phonedIn')}</Act>}
          />
        )}
        <StaleStrip
          error={query.data === undefined ? null : query.error}
          readAtMs={query.dataUpdatedAt}
          zone={zone ?? 'UTC'}
        />
        <QueryState query={query} loading={<Lines rows={6} hasVessel />}>
          {({ items: requests }) =>
            requests.length === 0 ? (
              <Plain kind="empty" title={t('requests.noneTitle')} acts={<Act to="/day">{t('requests.toBoard')}</Act>}>
                {t('requests.noneText')}
              </Plain>
            ) : (
              <RequestsList requests={requests} now={now} chosenVisitId={picked} onOpenVisit={openVisit} />
            )
          }
        </QueryState>
      </div>
      {side}
    </div>
  );
}
