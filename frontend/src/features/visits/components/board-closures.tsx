import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { DayBoard } from '../api/day-board';
import { shareOf, type BoardHours } from '../board-model';
import { hoursOn } from '../calendar-model';
import { useClosureWords } from '../closure-words';

/** What of the day is closed, hatched on a line of its own; nothing when all of it is open. */
export function BoardClosures({ board, hours }: { board: DayBoard; hours: BoardHours }): ReactNode {
  const { t } = useTranslation('visits');
  const closure = useClosureWords();
  const { day, date, zone } = board;
  const spans = day.closed.map(({ from, to, why }) => ({
    why: why === '' ? t('closed.day') : t('closed.why', { why: closure(why) }),
    left: from === null ? 0 : shareOf(hoursOn(date, from, zone), hours),
    right: to === null ? 1 : shareOf(hoursOn(date, to, zone), hours),
  }));
  if (spans.length === 0 && !day.isWorkingDay) spans.push({ why: t('closed.day'), left: 0, right: 1 });
  if (spans.length === 0) return null;
  return (
    <div className="board-row board-closed" role="row" aria-label={t('closed.span')}>
      <div className="board-who s mid" role="rowheader">
        {t('closed.span')}
      </div>
      <div className="board-lane" role="gridcell">
        {spans.map(({ why, left, right }) => (
          <span key={why} className="cal-closed" style={{ left: `${left * 100}%`, width: `${(right - left) * 100}%` }}>
            <span>{why}</span>
          </span>
        ))}
      </div>
    </div>
  );
}
