import { useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../components/icon';
import { Mark } from '../components/mark';
import { DayDrawing, SlimDayDrawing } from './week-ribbon-day';
import type { RibbonDay, WeekRibbonProps } from './week-ribbon.types';

export type { RibbonDay, RibbonMark, RibbonShelf, WeekRibbonProps } from './week-ribbon.types';

const daysInWeek = 5;
/** A pointer that went less far than this was a press, px. */
const dragThreshold = 48;

/**
 * Two working weeks: the only date control. Click or Enter picks a day, arrow keys walk the days, Page Up and Page Down, the
 * end arrows or a drag move by weeks.
 */
export function WeekRibbon(props: WeekRibbonProps): ReactNode {
  const { days, hours = { from: 7, to: 17 }, nowFraction, form = 'desk', over, span, end, onMove } = props;
  const { t } = useTranslation('marks');
  const drag = useDrag(onMove);
  const today = days.find((day) => day.isToday)?.date;
  const stop = tabStop(days);
  const isPhone = form === 'phone';
  return (
    <div className={`ribbon ${isPhone ? 'phone' : ''}`} role="group" aria-label={t('ribbon.name')}>
      {isPhone ? null : (
        <>
          <div className="ribbon-span">
            <span className="xs mut">{over}</span>
            <span className="n">{span}</span>
          </div>
          <Step word={t('ribbon.earlier')} icon="left" onStep={() => onMove(-1)} />
        </>
      )}
      <div className="ribbon-days" onKeyDown={(event) => walk(event, onMove)} {...drag.handlers}>
        {days.map((day, index) => (
          <Day
            key={day.date}
            day={day}
            edges={edgesOf(days, index)}
            hasGapAfter={index === daysInWeek - 1}
            isTabStop={index === stop}
            onPick={(date) => (drag.wasDragged() ? undefined : props.onPick(date))}
          >
            {isPhone ? (
              <SlimDayDrawing day={day} />
            ) : (
              <DayDrawing
                day={day}
                hours={hours}
                isPast={today !== undefined && day.date < today}
                nowFraction={day.isToday ? nowFraction : undefined}
              />
            )}
          </Day>
        ))}
      </div>
      {isPhone ? null : <Step word={t('ribbon.later')} icon="right" onStep={() => onMove(1)} />}
      {end && !isPhone ? <div className="ribbon-end">{end}</div> : null}
    </div>
  );
}

function Step({ word, icon, onStep }: { word: string; icon: 'left' | 'right'; onStep: () => void }): ReactNode {
  return (
    <button type="button" className="step" aria-label={word} onClick={onStep}>
      <Icon name={icon} size={18} />
    </button>
  );
}

interface DayProps {
  day: RibbonDay;
  edges: string;
  hasGapAfter: boolean;
  isTabStop: boolean;
  onPick: (date: string) => void;
  children: ReactNode;
}

function Day({ day, edges, hasGapAfter, isTabStop, onPick, children }: DayProps): ReactNode {
  const { t, i18n } = useTranslation('marks');
  const language = i18n.resolvedLanguage ?? 'en';
  const words = dayWords(day, t);
  return (
    <>
      <button
        type="button"
        className={`day ${day.isToday ? 'today' : ''} ${day.isClosed ? 'closed' : ''} ${edges}`}
        aria-label={words}
        aria-current={day.isToday ? 'date' : undefined}
        aria-pressed={day.isBracketed ?? false}
        tabIndex={isTabStop ? 0 : -1}
        onClick={() => onPick(day.date)}
      >
        <DayHead day={day} language={language} note={t('ribbon.closed')} notUp={t('ribbon.notUp', { count: day.notUp })} />
        {children}
        {day.notUp > 0 ? <Mark name="waits-on" size={16} className="flag" /> : null}
        <span className="hidden-words list-words" aria-hidden="true">
          {words}
        </span>
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

function edgesOf(days: readonly RibbonDay[], index: number): string {
  if (!days[index]?.isBracketed) return '';
  const isFirst = !days[index - 1]?.isBracketed;
  const isLast = !days[index + 1]?.isBracketed;
  return ['covered', isFirst ? 'first' : '', isLast ? 'last' : ''].filter(Boolean).join(' ');
}

/** The day that Tab reaches: the first bracketed one, else today, else the first. */
function tabStop(days: readonly RibbonDay[]): number {
  const covered = days.findIndex((day) => day.isBracketed);
  return Math.max(0, covered >= 0 ? covered : days.findIndex((day) => day.isToday));
}

function walk(event: KeyboardEvent<HTMLDivElement>, onMove: (weeks: number) => void): void {
  const buttons = [...event.currentTarget.querySelectorAll<HTMLButtonElement>('button.day')];
  const at = buttons.findIndex((button) => button === document.activeElement);
  const targets: Record<string, number> = { ArrowLeft: at - 1, ArrowRight: at + 1, Home: 0, End: buttons.length - 1 };
  const weeks = { PageUp: -1, PageDown: 1 }[event.key];
  const target = targets[event.key];
  if (weeks === undefined && target === undefined) return;
  event.preventDefault();
  if (weeks !== undefined) onMove(weeks);
  else if (target !== undefined && target >= 0 && target < buttons.length) buttons[target]?.focus();
  else onMove(target === -1 ? -1 : 1);
}

interface Drag {
  wasDragged: () => boolean;
  handlers: {
    onPointerDown: (event: PointerEvent<HTMLElement>) => void;
    onPointerUp: (event: PointerEvent<HTMLElement>) => void;
  };
}

/** A drag moves whole weeks; the press that ends it picks nothing. */
function useDrag(onMove: (weeks: number) => void): Drag {
  const startX = useRef<number | null>(null);
  const isDragged = useRef(false);
  return {
    wasDragged: () => isDragged.current,
    handlers: {
      onPointerDown: (event) => {
        startX.current = event.clientX;
        isDragged.current = false;
      },
      onPointerUp: (event) => {
        if (startX.current === null) return;
        const dx = event.clientX - startX.current;
        startX.current = null;
        if (Math.abs(dx) < dragThreshold) return;
        isDragged.current = true;
        // The press that follows this release comes before any timer.
        window.setTimeout(() => (isDragged.current = false), 0);
        const weekWidth = event.currentTarget.getBoundingClientRect().width / 2 || 1;
        onMove(-Math.sign(dx) * Math.max(1, Math.round(Math.abs(dx) / weekWidth)));
      },
    },
  };
}

/** What waits on you, for the right end of the ribbon: a lozenge, a count in words, two lines. */
export function RibbonEnd({ title, lines }: { title: ReactNode; lines: readonly ReactNode[] }): ReactNode {
  return (
    <>
      <span className="st">
        <Mark name="waits-on-you" />
        <span>{title}</span>
      </span>
      {lines.slice(0, 2).map((line, index) => (
        <div key={index}>{line}</div>
      ))}
    </>
  );
}
