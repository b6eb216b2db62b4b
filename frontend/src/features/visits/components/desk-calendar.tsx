import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { Calendar } from '../../../app/layout/ribbon-days';
import { Act } from '../../../components/act';
import { Plain } from '../../../components/plain';
import { useTimeWords } from '../../../lib/time';
import { useIsNarrow } from '../../../lib/use-media';
import type { CalendarAddress } from '../calendar-address';
import { calendarDays, shownDates, tractsOf } from '../calendar-model';
import { CalendarHead } from './calendar-head';
import type { LaneOffer } from './lane-cell';
import { StaleStrip } from './stale-strip';
import { VisitList } from './visit-list';
import { WeekGrid } from './week-grid';
import '../calendar-head.css';

export interface CalendarViewProps {
  calendar: Calendar;
  now: Date;
  address: CalendarAddress;
  readAtMs: number;
  error: unknown;
  /** Without it nothing can be asked for from here. */
  onRequest?: () => void;
}

export interface DeskCalendarProps extends CalendarViewProps {
  /** A day of the first week shown. */
  date: string;
  offers: readonly LaneOffer[];
  tract: string | null;
  onTract: (tract: string | null) => void;
}

/** The calendar of desk and tablet: a week, two, or a list. */
export function DeskCalendar(props: DeskCalendarProps): ReactNode {
  const { calendar, date, now, address, tract, offers, onRequest } = props;
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const isNarrow = useIsNarrow();
  const { view, panel } = address;
  const dates = shownDates(date, view === 'week' ? 1 : 2, calendar);
  const days = calendarDays(calendar, dates, tract);
  const listed = calendar.visits.filter(
    (visit) => dates.includes(visit.window.date) && (tract === null || visit.tractName === tract),
  );
  const [first, last] = [dates[0] ?? date, dates.at(-1) ?? date];
  const chosenVisitId = panel.kind === 'visit' ? panel.visitId : null;
  const shown = { now, chosenVisitId, onOpenVisit: address.openVisit };
  return (
    <>
      <CalendarHead
        range={words.dateRange(first, last, true)}
        zoneWords={words.zone(calendar.zone, now)}
        tracts={tractsOf(calendar)}
        tract={tract}
        onTract={props.onTract}
        view={view}
        onView={address.setView}
        onRequest={panel.kind === 'request' ? undefined : onRequest}
        isNarrow={isNarrow || panel.kind !== 'none'}
      />
      <StaleStrip error={props.error} readAtMs={props.readAtMs} zone={calendar.zone}>
        {onRequest === undefined ? undefined : t('stale.noRequest')}
      </StaleStrip>
      <NoVisits calendar={calendar} count={listed.length} onRequest={onRequest} />
      {calendar.lanes.length === 0 ? null : view === 'list' ? (
        <VisitList {...shown} visits={listed} zone={calendar.zone} />
      ) : (
        <WeekGrid {...shown} calendar={calendar} days={days} offers={offers} />
      )}
    </>
  );
}

/** What to do where nothing stands yet: add lots, or request a window for those there are. */
export function NoVisits({
  calendar,
  count,
  onRequest,
}: {
  calendar: Calendar;
  count: number;
  onRequest?: () => void;
}): ReactNode {
  const { t } = useTranslation('visits');
  if (count > 0) return null;
  if (calendar.lanes.length > 0) {
    return (
      <p className="no-visits s mid" role="status">
        {t('empty.span')}
      </p>
    );
  }
  return (
    <Plain
      kind="empty"
      title={t('empty.title')}
      picture={<div className="empty-brackets" aria-hidden="true" />}
      acts={
        onRequest === undefined ? undefined : (
          <>
            <Act kind="first" to="/lots/new">
              {t('empty.addLots')}
            </Act>
            <Act kind="text" to="/rule-cards">
              {t('empty.ruleCard')}
            </Act>
          </>
        )
      }
    >
      {t('empty.text')}
    </Plain>
  );
}
