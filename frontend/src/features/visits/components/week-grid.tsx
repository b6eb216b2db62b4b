import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { Calendar } from '../../../app/layout/ribbon-days';
import { hoursOfDay } from '../../../lib/local-days';
import { useTimeWords } from '../../../lib/time';
import { shortNames, shownHours, type CalendarDay } from '../calendar-model';
import { DayColumn } from './day-column';
import { HourEdge } from './hour-edge';
import type { LaneOffer } from './lane-cell';
import { useGridKeys } from './use-grid-keys';
import '../week-grid.css';
import '../lane.css';

export interface WeekGridProps {
  calendar: Calendar;
  days: readonly CalendarDay[];
  now: Date;
  chosenVisitId: string | null;
  offers: readonly LaneOffer[];
  onOpenVisit: (visitId: string) => void;
}

const pxPerHour = 72;

/** Days side by side, hours down the left edge, a lane per department. Arrow keys walk the visits. */
export function WeekGrid({ calendar, days, now, chosenVisitId, offers, onOpenVisit }: WeekGridProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const ids = days.flatMap((day) => day.cells.flatMap((cell) => cell.visits.map(({ id }) => id)));
  const keys = useGridKeys('columns', ids);
  const { zone, today } = calendar;
  const scale = { ...shownHours(days, zone), pxPerHour };
  const names = shortNames(calendar.lanes.map(({ name }) => name));
  const [first, last] = [days[0]?.date ?? today, days.at(-1)?.date ?? today];
  const nowHour = hoursOfDay(now, zone);
  const isNowShown = days.some(({ date }) => date === today) && nowHour >= scale.from && nowHour <= scale.to;
  return (
    <div className="cal-scroll">
      <div
        className={`cal ${days.length > 7 ? 'two' : ''}`}
        role="grid"
        aria-label={t('cal.grid', { days: words.dateRange(first, last) })}
        style={{ gridTemplateColumns: `55px repeat(${days.length}, minmax(0, 1fr))` }}
        onKeyDown={keys.onKeyDown}
        onFocus={keys.onFocus}
      >
        <div className="cal-corner" aria-hidden="true" />
        <HourEdge
          scale={scale}
          labelOf={hourWords}
          now={isNowShown ? { hour: nowHour, words: minuteWords(nowHour) } : null}
        />
        {days.map((day) => (
          <DayColumn
            key={day.date}
            day={day}
            names={names}
            scale={scale}
            zone={zone}
            today={today}
            now={now}
            keys={keys}
            chosenVisitId={chosenVisitId}
            offers={offers}
            onOpenVisit={onOpenVisit}
          />
        ))}
      </div>
    </div>
  );
}

/** "1:00" of 13: the day's own rule leaves am and pm out. */
function hourWords(hour: number): string {
  return `${((hour + 11) % 12) + 1}:00`;
}

function minuteWords(hour: number): string {
  const minutes = Math.floor((hour % 1) * 60 + 1e-6);
  return `${((Math.floor(hour) + 11) % 12) + 1}:${String(minutes).padStart(2, '0')}`;
}
