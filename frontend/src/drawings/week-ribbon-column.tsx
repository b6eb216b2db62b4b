import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../components/mark';
import type { RibbonDay } from './week-ribbon.types';

interface RibbonColumnProps {
  day: RibbonDay;
  edges: string;
  hasGapAfter: boolean;
  isTabStop: boolean;
  onPick: (date: string) => void;
  children: ReactNode;
}

/** One day of the ribbon: its head, its drawing, and its name to assistive readers. */
export function RibbonColumn({ day, edges, hasGapAfter, isTabStop, onPick, children }: RibbonColumnProps): ReactNode {
  const { t, i18n } = useTranslation('marks');
  const language = i18n.resolvedLanguage ?? 'en';
  const words = dayWords(day, t);
  return (
    <>
      <button
        type="button"
        className={`day ${day.isToday ? 'today' : ''} ${day.isClosed ? 'closed' : ''} ${edges}`}
        aria-current={day.isToday ? 'date' : undefined}
        aria-pressed={day.isBracketed ?? false}
        tabIndex={isTabStop ? 0 : -1}
        onClick={() => onPick(day.date)}
      >
        <DayHead
          day={day}
          language={language}
          note={t('ribbon.closed')}
          notUp={t('ribbon.notUp', { count: day.notUp })}
        />
        {children}
        {day.notUp > 0 ? <Mark name="waits-on" size={16} className="flag" /> : null}
        <span className="hidden-words list-words">{words}</span>
      </button>
      {hasGapAfter ? <span className={`ribbon-gap ${edges === 'covered' ? 'covered' : ''}`} /> : null}
    </>
  );
}

function DayHead(props: { day: RibbonDay; language: string; note: string; notUp: string }): ReactNode {
  const { day, language, note, notUp } = props;
  const at = new Date(`${day.date}T12:00:00Z`);
  const format = (options: Intl.DateTimeFormatOptions): string =>
    new Intl.DateTimeFormat(language, { ...options, timeZone: 'UTC' }).format(at);
  const visits = day.visits ?? day.marks.length;
  const isUrgent = day.isNoteUrgent ?? day.notUp > 0;
  const shown = day.note ?? (day.isClosed ? note : day.notUp > 0 ? notUp : visits > 0 ? String(visits) : '');
  return (
    <span className="day-head" aria-hidden="true">
      <span>
        <span className="wide">{format({ weekday: 'short' })}</span>
        <span className="slim">{format({ weekday: 'narrow' })}</span>
        <span className="n">{format({ day: 'numeric' })}</span>
      </span>
      <span className={`note ${isUrgent ? 'brass' : ''}`}>{shown}</span>
    </span>
  );
}

type Translate = ReturnType<typeof useTranslation>['t'];

/** "Wed, Apr 15, 4 visits, 2 not up" */
function dayWords(day: RibbonDay, t: Translate): string {
  const parts = [day.label, day.isToday ? t('ribbon.today') : '', day.isClosed ? t('ribbon.closed') : ''];
  if (!day.isClosed) parts.push(t('ribbon.visits', { count: day.visits ?? day.marks.length }));
  if (day.notUp > 0) parts.push(t('ribbon.notUp', { count: day.notUp }));
  else if (day.note && !day.isClosed) parts.push(day.note);
  return parts.filter((part) => part !== '').join(', ');
}
