import type { CSSProperties, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Mark, type MarkName } from './mark';
import { markTones, type MarkTone } from './mark-names';

export interface SlipProps {
  /** "Lot 17". */
  title: ReactNode;
  /** Second words beside the title, such as the tract. */
  place?: ReactNode;
  time?: ReactNode;
  /** A visit's state or outcome. */
  state: MarkName;
  /** Share of the required systems standing, 0 to 1. */
  share?: number;
  /** Replaces the state's word: "water not up". */
  word?: ReactNode;
  tone?: MarkTone;
  waits?: 'waits-on-you' | 'waits-on' | 'past-time';
  /** The number of open corrections. */
  corrections?: number;
  form?: 'desk' | 'phone';
  isChosen?: boolean;
  isPast?: boolean;
  to?: string;
  onOpen?: () => void;
  className?: string;
  /** Where the calendar puts it. */
  style?: CSSProperties;
  /** For a grid walked by arrow keys: one slip is in the tab order. */
  tabIndex?: number;
  'aria-label'?: string;
}

const closedStates: readonly MarkName[] = ['pass', 'fail', 'not-ready', 'no-access', 'withdrawn', 'declined', 'freed'];

/** A visit: a ruled slip with a sight glass on its left edge, as full as the share of systems standing. */
export function Slip(props: SlipProps): ReactNode {
  const { state, form = 'desk', isChosen, isPast, to, onOpen, className = '', style } = props;
  const shape = ['slip', state, form, isChosen ? 'chosen' : '', isPast ? 'past' : '', className];
  const outer = { className: shape.filter(Boolean).join(' '), style };
  const named = { tabIndex: props.tabIndex, 'aria-label': props['aria-label'] };
  if (to !== undefined) {
    return (
      <Link to={to} {...outer} {...named}>
        <SlipInside {...props} />
      </Link>
    );
  }
  if (onOpen) {
    return (
      <button type="button" onClick={onOpen} aria-pressed={isChosen} {...outer} {...named}>
        <SlipInside {...props} />
      </button>
    );
  }
  return (
    <div {...outer}>
      <SlipInside {...props} />
    </div>
  );
}

function SlipInside({
  title,
  place,
  time,
  state,
  share = 0,
  word,
  tone,
  waits,
  corrections,
  form,
}: SlipProps): ReactNode {
  const { t } = useTranslation('marks');
  return (
    <>
      {closedStates.includes(state) ? (
        <span className="tag">
          <Mark name={state} size={form === 'phone' ? 24 : 20} />
        </span>
      ) : (
        <SightGlass state={state} share={share} />
      )}
      <span className="body">
        <span className="spread">
          <span>
            <span className="b">{title}</span> {place ? <span className="mid">{place}</span> : null}
          </span>
          {time ? <span className="mid nw">{time}</span> : null}
        </span>
        <span className={`word t-${tone ?? markTones[state]}`}>{word ?? t(`${state}`)}</span>
      </span>
      {waits ? (
        <span className="flag">
          <Mark name={waits} size={form === 'phone' ? 24 : 20} title={t(`${waits}`)} />
        </span>
      ) : null}
      {corrections ? (
        <span className="flag">
          <Mark name="correction-open" number={corrections} size={form === 'phone' ? 24 : 20} />
          <span className="hidden-words">{t('page.openCorrections', { count: corrections })}</span>
        </span>
      ) : null}
    </>
  );
}

/** The glass alone: also at the edge of rows and heads. */
export function SightGlass({ state, share }: { state: MarkName; share: number }): ReactNode {
  const isFull = state === 'ready' || state === 'underway';
  const isDashed = state === 'requested' || state === 'standby';
  const level = Math.max(0, Math.min(1, isFull ? 1 : share)) * 92;
  return (
    <span className={`glass ${isFull ? 'full' : ''} ${isDashed ? 'dashed' : ''}`} aria-hidden="true">
      <i style={{ height: `${level}%` }} />
    </span>
  );
}
