import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import type { CalendarDay } from '../calendar-model';
import type { HourScale } from './hour-edge';
import type { GridKeys } from './use-grid-keys';
import { LaneCellView, type LaneOffer } from './lane-cell';

export interface DayColumnProps {
  day: CalendarDay;
  names: readonly string[];
  scale: HourScale;
  zone: string;
  today: string;
  now: Date;
  keys: GridKeys;
  chosenVisitId: string | null;
  offers: readonly LaneOffer[];
  onOpenVisit: (visitId: string) => void;
}

/** A day of the calendar: its head with the departments' names, and a lane for each. A row to assistive readers. */
export function DayColumn(props: DayColumnProps): ReactNode {
  const { day, names, zone, today } = props;
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const isToday = day.date === today;
  const title = isToday ? t('cal.todayDay', { day: words.date(day.date) }) : words.date(day.date);
  return (
    <div
      className={`cal-day ${isToday ? 'today' : ''} ${day.date < today ? 'past' : ''}`}
      role="row"
      aria-label={title}
      style={{ gridTemplateColumns: `repeat(${day.cells.length}, minmax(0, 1fr))` }}
    >
      <div className="cal-day-head" role="rowheader">
        <div className="cal-day-name">
          <Numeral text={title} />
        </div>
        <div className="cal-names">
          {day.cells.map(({ lane }, index) => (
            <div key={lane.departmentId} className="xs mut">
              {names[index]}
              {lane.zone === zone ? null : <div>{words.zone(lane.zone)}</div>}
            </div>
          ))}
        </div>
      </div>
      {day.cells.map((cell, index) => (
        <LaneCellView
          key={cell.lane.departmentId}
          {...props}
          cell={cell}
          date={day.date}
          isFirst={index === 0}
          offers={props.offers.filter(
            (offer) => offer.departmentId === cell.lane.departmentId && offer.window.date === day.date,
          )}
        />
      ))}
    </div>
  );
}
