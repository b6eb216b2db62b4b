import { useRef, type PointerEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../components/icon';
import { RibbonColumn } from './week-ribbon-column';
import { useRibbonKeys } from './use-ribbon-keys';
import { DayDrawing, SlimDayDrawing } from './week-ribbon-day';
import type { RibbonDay, WeekRibbonProps } from './week-ribbon.types';

export { RibbonEnd } from './ribbon-end';
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
  const keys = useRibbonKeys(days, onMove);
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
      <div className="ribbon-days" {...keys} {...drag.handlers}>
        {days.map((day, index) => (
          <RibbonColumn
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
          </RibbonColumn>
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
