import type { CSSProperties, ReactNode } from 'react';
import { Mark, type MarkName } from '../components/mark';
import type { RibbonDay, RibbonMark, RibbonShelf } from './week-ribbon.types';

const tags: readonly MarkName[] = ['pass', 'fail', 'not-ready', 'no-access', 'withdrawn', 'declined', 'freed'];
const vesselLevels: Partial<Record<MarkName, number>> = { 'part-up': 0.5, ready: 0.88, underway: 0.88 };
const vesselWidth = 6.5;
const vesselHeight = 17;
/** Width of a day column at the desk in px, near enough to crowd marks on a shelf. */
const usualDayWidth = 94;

interface Hours {
  from: number;
  to: number;
}

export interface DayDrawingProps {
  day: RibbonDay;
  hours: Hours;
  isPast: boolean;
  nowFraction?: number;
}

/** One day of the desk's ribbon: shelves, what stands on them, and now. */
export function DayDrawing({ day, hours, isPast, nowFraction }: DayDrawingProps): ReactNode {
  const rows = Math.max(
    1,
    ...day.shelves.map((shelf) => (shelf.row ?? 0) + 1),
    ...day.marks.map((m) => (m.row ?? 0) + 1),
  );
  // a third department stands in the second's row: the ribbon is two rows high
  const topOf = (row = 0): number => (rows === 1 ? 12 : 4 + Math.min(row, 1) * 23);
  const ticks = { '--half': `${50 / (hours.to - hours.from)}%`, '--hour': `${100 / (hours.to - hours.from)}%` };
  return (
    <span className="day-draw" aria-hidden="true">
      <span className="ticks" style={ticks as CSSProperties} />
      {(day.closures ?? []).map((span) => (
        <span
          key={`${span.row}-${span.from}`}
          className="closure hatched"
          style={box(span, hours, topOf(span.row) - 1)}
        />
      ))}
      {day.shelves.map((shelf) => (
        <Shelf key={`${shelf.row}-${shelf.from}`} shelf={shelf} hours={hours} top={topOf(shelf.row)} isPast={isPast} />
      ))}
      {placeMarks(day, hours).map(({ mark, left }, index) => (
        <span key={index} className="stand" style={{ left, top: topOf(mark.row) + 1 }}>
          <Standing state={mark.mark} />
        </span>
      ))}
      {nowFraction === undefined ? null : <span className="now" style={{ left: `${nowFraction * 100}%` }} />}
    </span>
  );
}

function percent(hour: number, hours: Hours): number {
  return ((hour - hours.from) / (hours.to - hours.from)) * 100;
}

function box(span: Hours, hours: Hours, top: number): CSSProperties {
  const left = percent(span.from, hours);
  return { left: `${left}%`, width: `${percent(span.to, hours) - left}%`, top };
}

function Shelf(props: { shelf: RibbonShelf; hours: Hours; top: number; isPast: boolean }): ReactNode {
  const { shelf, hours, top, isPast } = props;
  const { booked, up = 0 } = shelf;
  return (
    <span className={`shelf ${isPast ? 'past' : ''} ${shelf.isShut ? 'shut' : ''}`} style={box(shelf, hours, top)}>
      {booked === undefined ? null : (
        <span className="load">
          <i className={booked >= 1 ? 'all' : ''} style={{ height: `${booked * 100}%` }} />
          <i className="up" style={{ height: `${booked * up * 100}%` }} />
        </span>
      )}
    </span>
  );
}

/** Marks of one shelf stand side by side about its middle; one without a shelf stands at its hour. */
function placeMarks(day: RibbonDay, hours: Hours): { mark: RibbonMark; left: string }[] {
  const groups = new Map<RibbonShelf | RibbonMark, RibbonMark[]>();
  for (const mark of day.marks) {
    const shelf = day.shelves.find((s) => (s.row ?? 0) === (mark.row ?? 0) && s.from <= mark.at && mark.at < s.to);
    const key = shelf ?? mark;
    groups.set(key, [...(groups.get(key) ?? []), mark]);
  }
  return [...groups].flatMap(([key, marks]) => {
    const isShelf = 'from' in key;
    const middle = isShelf ? (key.from + key.to) / 2 : key.at;
    const room = isShelf ? ((key.to - key.from) / (hours.to - hours.from)) * usualDayWidth - 4 : 10;
    const step = Math.min(10, room / marks.length);
    const ordered = [...marks].sort((a, b) => a.at - b.at);
    return ordered.map((mark, index) => ({
      mark,
      left: `calc(${percent(middle, hours)}% + ${(index - (marks.length - 1) / 2) * step}px)`,
    }));
  });
}

/** A visit on its shelf: a slim vessel, or the tag of its outcome. */
export function Standing({ state, tagSize = 16 }: { state: MarkName; tagSize?: 16 | 20 }): ReactNode {
  if (tags.includes(state)) return <Mark name={state} size={tagSize} />;
  const level = vesselLevels[state] ?? 0;
  const isDashed = state === 'requested' || state === 'standby';
  const edge = isDashed ? 'var(--ink2)' : level > 0.6 ? 'var(--water)' : 'var(--ink)';
  const top = vesselHeight * (1 - level);
  return (
    <svg width={vesselWidth} height={vesselHeight} viewBox={`0 0 ${vesselWidth} ${vesselHeight}`}>
      {level > 0 ? (
        <path d={`M1 ${top}h${vesselWidth - 2}V${vesselHeight - 1}h-${vesselWidth - 2}Z`} fill="var(--water)" />
      ) : null}
      <path
        d={`M0 0V${vesselHeight}h${vesselWidth}V0`}
        fill="none"
        stroke={edge}
        strokeWidth="1.4"
        strokeDasharray={isDashed ? '2 1.8' : undefined}
      />
      {state === 'underway' ? (
        <>
          <circle cx={vesselWidth} cy={vesselHeight - 4} r="4.2" fill="var(--paper)" />
          <circle cx={vesselWidth} cy={vesselHeight - 4} r="3.2" fill="var(--primer)" />
        </>
      ) : null}
    </svg>
  );
}

/** One slim column of the phone's ribbon: what there is that day, side by side. */
export function SlimDayDrawing({ day }: { day: RibbonDay }): ReactNode {
  const marks = [...day.marks].sort((a, b) => a.at - b.at).slice(0, 4);
  return (
    <span className="day-draw slim" aria-hidden="true">
      {marks.map((mark, index) => (
        <span key={index}>
          <Standing state={mark.mark} />
        </span>
      ))}
    </span>
  );
}
