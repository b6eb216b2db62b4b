import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { PhoneHead } from '../../../components/head';
import { useTimeWords } from '../../../lib/time';
import { calendarDays, shownDates } from '../calendar-model';
import { nextCutoff } from '../next-cutoff';
import { Agenda } from './agenda';
import { serverNow } from './cutoff-line';
import { NoVisits, type CalendarViewProps } from './desk-calendar';
import { StaleStrip } from './stale-strip';
import '../side-panel.css';

/** The calendar of a phone: an agenda from the day shown on, the request at the thumb. */
export function PhoneCalendar({
  calendar,
  from,
  now,
  address,
  readAtMs,
  error,
  onRequest,
}: CalendarViewProps & { from: string }): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const dates = shownDates(from, 2, calendar).filter((date) => date >= from);
  const days = calendarDays(calendar, dates, null);
  // The server's clock says what is closed.
  const cutoff = onRequest === undefined ? null : nextCutoff(days, serverNow(now, calendar.now, readAtMs));
  const count = days.flatMap(({ cells }) => cells.flatMap(({ visits }) => visits)).length;
  return (
    <div className={onRequest === undefined ? '' : 'has-thumb'}>
      <PhoneHead label={words.zone(calendar.zone, now)} title={t('cal.label')} />
      <StaleStrip error={error} readAtMs={readAtMs} zone={calendar.zone}>
        {onRequest === undefined ? undefined : t('stale.noRequest')}
      </StaleStrip>
      <NoVisits calendar={calendar} count={count} onRequest={onRequest} />
      {calendar.lanes.length === 0 ? null : (
        <Agenda calendar={calendar} days={days} now={now} cutoff={cutoff} onOpenVisit={address.openVisit} />
      )}
      {onRequest === undefined ? null : (
        <div className="thumb">
          <Act kind="first" size="lg" wide onClick={onRequest}>
            {t('req.title')}
          </Act>
        </div>
      )}
    </div>
  );
}
