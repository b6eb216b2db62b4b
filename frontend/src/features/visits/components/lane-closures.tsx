import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { hoursOn, type LaneCell } from '../calendar-model';
import { useClosureWords } from '../closure-words';
import type { HourScale } from './hour-edge';

export interface LaneClosuresProps {
  cell: LaneCell;
  date: string;
  zone: string;
  scale: HourScale;
}

/** What is closed on a lane, hatched: the whole day or spans of it, with why. */
export function LaneClosures({ cell: { day }, date, zone, scale }: LaneClosuresProps): ReactNode {
  const { t } = useTranslation('visits');
  const why = useClosureWords();
  if (day === null) return null;
  const whole = day.closed.find((span) => span.from === null);
  if (!day.isWorkingDay || whole !== undefined) {
    return (
      <div className="cal-closed" style={{ top: 0, bottom: 0 }}>
        <span>
          {whole === undefined || whole.why === '' ? t('closed.day') : t('closed.why', { why: why(whole.why) })}
        </span>
      </div>
    );
  }
  return day.closed.map(({ from, to, why: reason }) => {
    if (from === null || to === null) return null;
    const start = Math.max(scale.from, hoursOn(date, from, zone));
    const end = Math.min(scale.to, hoursOn(date, to, zone));
    return (
      <div
        key={from}
        className="cal-closed"
        style={{ top: (start - scale.from) * scale.pxPerHour, height: (end - start) * scale.pxPerHour }}
      >
        <span>{reason === '' ? t('closed.span') : t('closed.why', { why: why(reason) })}</span>
      </div>
    );
  });
}
