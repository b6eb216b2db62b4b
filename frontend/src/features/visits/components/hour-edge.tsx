import type { ReactNode } from 'react';
import { Numeral } from '../../../components/numeral';

export interface HourScale {
  readonly from: number;
  readonly to: number;
  readonly pxPerHour: number;
}

export interface HourEdgeProps {
  scale: HourScale;
  /** Clock words of an hour of the day, am and pm left out as on any day's own rule: "1:00". */
  labelOf: (hour: number) => string;
  /** Now, in hours, with its words; null when no day shown is today. */
  now: { hour: number; words: string } | null;
}

const widthPx = 55;
/** Ticks stand every quarter of an hour. */
const quarters = 4;
/** An hour's label gives way to now's when they would touch, px. */
const labelRoom = 14;

/** The left edge of the calendar: a rule of hours, a tick every quarter. */
export function HourEdge({ scale, labelOf, now }: HourEdgeProps): ReactNode {
  const height = (scale.to - scale.from) * scale.pxPerHour;
  const steps = Array.from({ length: (scale.to - scale.from) * quarters + 1 }, (_, step) => step);
  const ticks = steps.map((step) => {
    const y = (step * scale.pxPerHour) / quarters;
    return `M${widthPx} ${y}h${step % quarters === 0 ? -14 : step % 2 === 0 ? -9 : -5}`;
  });
  const nowY = now === null ? null : (now.hour - scale.from) * scale.pxPerHour;
  return (
    <div className="cal-edge" aria-hidden="true">
      <svg width={widthPx} height={height} viewBox={`0 0 ${widthPx} ${height}`}>
        <path d={ticks.join('')} stroke="var(--ink)" strokeWidth="1" fill="none" />
      </svg>
      {Array.from({ length: scale.to - scale.from + 1 }, (_, index) => scale.from + index)
        .filter((hour) => nowY === null || Math.abs((hour - scale.from) * scale.pxPerHour - nowY) > labelRoom)
        .map((hour) => (
          <span key={hour} className="xs mid" style={{ top: (hour - scale.from) * scale.pxPerHour }}>
            <Numeral text={labelOf(hour)} />
          </span>
        ))}
      {now === null || nowY === null ? null : (
        <span className="xs b t-primer" style={{ top: nowY }}>
          <Numeral text={now.words} />
        </span>
      )}
    </div>
  );
}
