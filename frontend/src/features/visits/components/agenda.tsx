import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { Calendar } from '../../../app/layout/ribbon-days';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { agendaOf, type AgendaWindow } from '../agenda-model';
import { shortNames, type CalendarDay } from '../calendar-model';
import { useClosureWords } from '../closure-words';
import type { NextCutoff } from '../next-cutoff';
import { upUrgency } from '../visit-look';
import { AgendaCloses, AgendaTimeLeft } from './agenda-cutoff';
import { AgendaWaits } from './agenda-waits';
import { VisitSlip } from './visit-slip';
import '../agenda.css';

export interface AgendaProps {
  calendar: Calendar;
  /** From the day shown on. */
  days: readonly CalendarDay[];
  now: Date;
  /** Until when a window can still be asked for; null where the reader does not ask, or for nothing left. */
  cutoff: NextCutoff | null;
  onOpenVisit: (visitId: string) => void;
}

/** The calendar of a phone: day under day, windows as brackets with the visits that stand in them. */
export function Agenda({ calendar, days, now, cutoff, onOpenVisit }: AgendaProps): ReactNode {
  const names = shortNames(calendar.lanes.map(({ name }) => name));
  const nameOf = (departmentId: string): string | undefined =>
    names.length < 2 ? undefined : names[calendar.lanes.findIndex((lane) => lane.departmentId === departmentId)];
  return days.map((day) => (
    <AgendaDay
      key={day.date}
      day={day}
      today={calendar.today}
      now={now}
      cutoff={cutoff?.date === day.date ? cutoff : null}
      nameOf={nameOf}
      onOpenVisit={onOpenVisit}
    />
  ));
}

interface AgendaDayProps {
  day: CalendarDay;
  today: string;
  now: Date;
  cutoff: NextCutoff | null;
  nameOf: (departmentId: string) => string | undefined;
  onOpenVisit: (visitId: string) => void;
}

function AgendaDay({ day, today, now, cutoff, nameOf, onOpenVisit }: AgendaDayProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const closure = useClosureWords();
  const { windows, closed } = agendaOf(day, now);
  const near = words.nearDay(day.date, today);
  const visits = day.cells.flatMap((cell) => cell.visits);
  const notUp = visits.filter((visit) => upUrgency(visit, now) !== 'none');
  const date = words.date(day.date);
  return (
    <section className="agenda-day" aria-label={near === null ? date : `${date}, ${near}`}>
      <div className="agenda-head">
        <h2 className="h2">
          <Numeral text={near === null ? date : `${date}, ${near}`} />
        </h2>
        {notUp.length > 0 ? (
          <span className="row b s t-brass">
            <Mark name="waits-on" />
            <span>{t('agenda.notUp', { count: notUp.length })}</span>
          </span>
        ) : null}
        {cutoff === null ? null : <AgendaCloses cutoff={cutoff} now={now} also={nameOf(cutoff.departmentId)} />}
      </div>
      <AgendaWaits visits={notUp} />
      {cutoff === null ? null : <AgendaTimeLeft cutoff={cutoff} now={now} />}
      {closed.map((one) => (
        <p key={`${one.departmentId} ${one.from ?? ''}`} className="agenda-closed">
          {[nameOf(one.departmentId), one.why === '' ? t('closed.day') : t('closed.why', { why: closure(one.why) })]
            .filter((part) => part !== undefined)
            .join(', ')}
        </p>
      ))}
      {windows.length === 0 && closed.length === 0 ? <p className="agenda-none s mid">{t('agenda.none')}</p> : null}
      {windows.map((window) => (
        <AgendaWindowView
          key={window.key}
          window={window}
          now={now}
          also={nameOf(window.departmentId)}
          onOpenVisit={onOpenVisit}
        />
      ))}
    </section>
  );
}

function AgendaWindowView({
  window,
  now,
  also,
  onOpenVisit,
}: {
  window: AgendaWindow;
  now: Date;
  also: string | undefined;
  onOpenVisit: (visitId: string) => void;
}): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const say = window.says === 'over' ? '' : t(`window.${window.says}`, { count: window.roomLeft });
  return (
    <div className="agenda-window">
      <span className="agenda-time">
        <Numeral text={words.clock(window.startAt, window.zone)} />
        <br />
        <Numeral text={words.clock(window.endAt, window.zone)} />
      </span>
      <div className="agenda-bracket">
        {window.visits.map((visit) => (
          <VisitSlip key={visit.id} visit={visit} now={now} form="phone" isFull also={also} onOpen={onOpenVisit} />
        ))}
        {window.visits.length === 0 ? (
          <span className="agenda-room">
            <span className={window.says === 'room' ? 'b' : 'mid'}>
              <Numeral text={say} />
            </span>
            {also === undefined ? null : <span className="mid">, {also}</span>}
          </span>
        ) : null}
      </div>
    </div>
  );
}
