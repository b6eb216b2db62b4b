import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { hoursOn, windowSays, type LaneCell } from '../calendar-model';
import type { Placed } from '../lane-layout';
import type { HourScale } from './hour-edge';

export interface LaneWindowsProps {
  cell: LaneCell;
  date: string;
  zone: string;
  scale: HourScale;
  now: Date;
  /** Where the slips stand: a window's words keep clear of them. */
  placed: readonly Placed[];
}

/** One line of words, px; "requests closed" may take two. */
const linePx = 17;

/** The windows of a lane as brackets with open sides, each saying its room. */
export function LaneWindows({ cell, date, zone, scale, now, placed }: LaneWindowsProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  return cell.day?.windows.map((window) => {
    const says = windowSays(window, now.getTime());
    const top = (hoursOn(date, window.startAt, zone) - scale.from) * scale.pxPerHour;
    const bottom = (hoursOn(date, window.endAt, zone) - scale.from) * scale.pxPerHour;
    const isCovered = (from: number, to: number): boolean =>
      placed.some((box) => box.topPx < to && box.topPx + box.heightPx > from);
    const wordPx = says === 'shut' ? 2 * linePx : linePx;
    const place = !isCovered(top, top + wordPx)
      ? 'at-top'
      : !isCovered(bottom - wordPx, bottom)
        ? 'at-end'
        : 'hidden-words';
    const say = says === 'over' ? '' : t(`window.${says}`, { count: window.roomLeft });
    const clock = words.window(window.startAt, window.endAt, cell.lane.zone);
    return (
      <div
        key={window.label}
        className={`cal-window ${says} ${cell.visits.length === 0 ? 'bare' : ''}`}
        style={{ top, height: bottom - top }}
      >
        <span className="hidden-words">{say === '' ? clock : `${clock}, ${say}`}</span>
        <span className={`xs ${place}`} aria-hidden="true">
          <Numeral text={say} />
        </span>
      </div>
    );
  });
}
