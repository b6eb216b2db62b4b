import type { MouseEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Icon, type IconName } from './icon';
import { Mark, type MarkName } from './mark';

export type ActKind = 'first' | 'other' | 'ending' | 'text';
export type ActSize = 'sm' | 'md' | 'lg';

export interface ActProps {
  /** One `first` act per view. `ending` acts withdraw, publish or record a fail: ask one question first. */
  kind?: ActKind;
  size?: ActSize;
  /** A place to go: renders a link. */
  to?: string;
  type?: 'button' | 'submit';
  /** The form a submit outside of it belongs to. */
  form?: string;
  onClick?: (event: MouseEvent<HTMLButtonElement | HTMLAnchorElement>) => void;
  /** Why the act cannot be done yet, in a few words; it stands in the act. */
  cannotYet?: ReactNode;
  /** The act is on its way: further presses are ignored. */
  busy?: boolean;
  /** What stands in the act meanwhile; "Sending" without one. */
  busyWord?: ReactNode;
  icon?: IconName;
  mark?: MarkName;
  wide?: boolean;
  className?: string;
  id?: string;
  'aria-label'?: string;
  'aria-describedby'?: string;
  'aria-expanded'?: boolean;
  'aria-controls'?: string;
  autoFocus?: boolean;
  children: ReactNode;
}

const kinds: Record<ActKind, string> = { first: 'pri', other: '', ending: 'red', text: 'txt' };

function classOf({ kind = 'other', size = 'md', cannotYet, busy, wide, className }: ActProps): string {
  const look = cannotYet ? 'no' : kinds[kind];
  const sizes = size === 'md' ? '' : size;
  return ['btn', look, sizes, busy ? 'busy' : '', wide ? 'wide' : '', className ?? ''].filter(Boolean).join(' ');
}

function ActWords({ icon, mark, cannotYet, busy, busyWord, children }: ActProps): ReactNode {
  const { t } = useTranslation('marks');
  if (cannotYet) {
    return (
      <>
        <span>{children}</span>
        <span className="why">{cannotYet}</span>
      </>
    );
  }
  return (
    <>
      {icon ? <Icon name={icon} size={18} /> : null}
      {mark ? <Mark name={mark} /> : null}
      <span>{busy ? (busyWord ?? t('page.sending')) : children}</span>
    </>
  );
}

/**
 * A ruled cell that does something. It is never `disabled`: an act that cannot be done yet keeps its place in the tab
 * order, says why, and does nothing when pressed.
 */
export function Act(props: ActProps): ReactNode {
  const { to, type = 'button', form, onClick, cannotYet, busy, id, autoFocus } = props;
  const isStopped = Boolean(cannotYet) || Boolean(busy);
  const shared = {
    id,
    className: classOf(props),
    'aria-label': props['aria-label'],
    'aria-describedby': props['aria-describedby'],
    'aria-expanded': props['aria-expanded'],
    'aria-controls': props['aria-controls'],
  };
  if (to !== undefined && !isStopped) {
    return (
      <Link to={to} onClick={onClick} {...shared}>
        <ActWords {...props} />
      </Link>
    );
  }
  const press = (event: MouseEvent<HTMLButtonElement>): void => {
    if (isStopped) event.preventDefault();
    else onClick?.(event);
  };
  return (
    <button
      type={type}
      form={form}
      onClick={press}
      aria-disabled={isStopped || undefined}
      aria-busy={busy || undefined}
      autoFocus={autoFocus}
      {...shared}
    >
      <ActWords {...props} />
    </button>
  );
}
