import type { ReactNode } from 'react';
import { Numeral } from '../components/numeral';

/** The rule of time a thread hangs on: days, entries at their time, long silences dimensioned. */
export function TimeRule({ label, children }: { label: string; children: ReactNode }): ReactNode {
  return (
    <ol className="time-rule" aria-label={label}>
      {children}
    </ol>
  );
}

/** "Wed, Apr 15" */
export function TimeRuleDay({ day }: { day: string }): ReactNode {
  return (
    <li className="new-day">
      <span className="at" />
      <div className="on">
        <Numeral text={day} />
      </div>
    </li>
  );
}

export interface TimeRuleEntryProps {
  /** "3:10 pm" */
  time: string;
  /** For machines; an ISO instant. */
  at?: string;
  /** A ledger entry: a thin line between the messages. */
  isThin?: boolean;
  children: ReactNode;
}

/** One message at full weight, or one ledger entry as a thin line. */
export function TimeRuleEntry({ time, at, isThin = false, children }: TimeRuleEntryProps): ReactNode {
  return (
    <li className={isThin ? 'thin' : ''}>
      <time className="at" dateTime={at}>
        <Numeral text={time} />
      </time>
      <div className="on">{children}</div>
    </li>
  );
}

/** A silence over six hours, dimensioned: "13 h 37 min". */
export function TimeRuleSilence({ text }: { text: string }): ReactNode {
  return (
    <li className="silence">
      <span className="at" />
      <div className="on">
        <svg width="12" height="34" viewBox="0 0 12 34" aria-hidden="true">
          <path d="M5.5 0V34" stroke="var(--ink)" strokeWidth="1" />
          <path d="M1 10l9-7M1 31l9-7" stroke="var(--ink)" strokeWidth="1.5" />
        </svg>
        {text}
      </div>
    </li>
  );
}
