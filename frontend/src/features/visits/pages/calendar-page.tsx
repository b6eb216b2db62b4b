import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { calendarQuery } from '../../../app/layout/ribbon-query';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { useNow } from '../../../lib/clock';
import { localDateOf, twoWorkWeeksOf, workingMondayOf } from '../../../lib/local-days';
import { QueryState } from '../../../lib/query-state';
import { useOrganization } from '../../../lib/session-context';
import { useShortcut } from '../../../lib/shortcuts';
import { useCoversDates, useShownDate } from '../../../lib/shown-date';
import { useIsPhone } from '../../../lib/use-media';
import { useCalendarAddress } from '../calendar-address';
import { PhoneCalendar } from '../components/phone-calendar';
import { DeskCalendar } from '../components/desk-calendar';
import { RequestPanel } from '../components/request-panel';
import { VisitPanel } from '../components/visit-panel';
import { windowKey } from '../offer-reasons';
import { useMayRequest } from '../use-may-request';
import { useRequesting } from '../use-requesting';
import { shownOffers } from '../components/offer-list';
import '../side-panel.css';

const deviceZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** The calendar: windows, visits, and beside it a request or one visit. */
export function CalendarPage(): ReactNode {
  const { t } = useTranslation('visits');
  const chosen = useOrganization();
  if (chosen === null) {
    return (
      <Plain kind="none" level={1} title={t('none.title')}>
        {t('none.text')}
      </Plain>
    );
  }
  return <OrganizationCalendar key={chosen.organization.id} organizationId={chosen.organization.id} />;
}

function OrganizationCalendar({ organizationId }: { organizationId: string }): ReactNode {
  const isPhone = useIsPhone();
  const now = useNow();
  const address = useCalendarAddress();
  const { panel } = address;
  const [shownDate] = useShownDate();
  const [tract, setTract] = useState<string | null>(null);
  const mayRequest = useMayRequest();
  const date = shownDate ?? localDateOf(now, deviceZone);
  const range = twoWorkWeeksOf(workingMondayOf(date));
  const [from, to] = [range[0] ?? date, range.at(-1) ?? date];
  const calendar = useQuery(calendarQuery({ from, to, organizationId }));
  const covered = isPhone
    ? [shownDate ?? date, shownDate ?? date]
    : [from, address.view === 'week' ? (range[4] ?? to) : to];
  useCoversDates(covered[0] ?? null, covered[1] ?? null);
  const isRequesting = panel.kind === 'request';
  const requesting = useRequesting(isRequesting ? panel.lotIds : [], isRequesting ? panel.stageCode : null);
  useShortcut('n', () => (mayRequest && !isRequesting ? address.openRequest() : undefined));
  const side = isRequesting ? (
    <RequestPanel
      requesting={requesting}
      onLots={address.openRequest}
      onStage={address.setStage}
      onClose={address.close}
    />
  ) : panel.kind === 'visit' ? (
    <VisitPanel key={panel.visitId} visitId={panel.visitId} onClose={address.close} />
  ) : null;
  const offers = requesting.offers.slice(0, shownOffers).map((offer) => ({
    departmentId: requesting.query.data?.departmentId ?? '',
    number: offer.number,
    window: offer.window,
    isChosen: offer.number === requesting.chosen?.number,
    onChoose: () => requesting.choose(windowKey(offer.window)),
  }));
  const shared = {
    now,
    address,
    readAtMs: calendar.dataUpdatedAt,
    error: calendar.error,
    onRequest: mayRequest ? () => address.openRequest() : undefined,
  };
  if (isPhone && side !== null) return side;
  return (
    <div className={side === null ? '' : 'with-side'}>
      <div className="side-main">
        <QueryState query={calendar} loading={<Lines rows={8} hasVessel />}>
          {(known) =>
            isPhone ? (
              <PhoneCalendar {...shared} calendar={known} from={shownDate ?? known.today} />
            ) : (
              <DeskCalendar {...shared} calendar={known} date={from} offers={offers} tract={tract} onTract={setTract} />
            )
          }
        </QueryState>
      </div>
      {side}
    </div>
  );
}
