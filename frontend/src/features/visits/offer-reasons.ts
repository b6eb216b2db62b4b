import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import { daysBetween, instantOf } from '../../lib/local-days';

type UpBy = RuleCardContent['readiness']['upBy'];

/** Why a window speaks for itself, or against: `offer.reasons.<code>`. */
export interface OfferReason {
  readonly code: 'room' | 'roomAll' | 'firstDay' | 'laterDays' | 'upBy' | 'deskPlaces';
  readonly isFor: boolean;
  readonly count?: number;
  /** When the tests must be up. */
  readonly at?: string;
}

/** When the tests must be up for a window, by the rule card: a clock time of its day or hours before it, never after its start. */
export function upByFor(upBy: UpBy, window: Pick<OfferedWindow, 'date' | 'startAt'>, zone: string): string {
  if (upBy.kind === 'hours-before') {
    return new Date(Date.parse(window.startAt) - upBy.hours * 3_600_000).toISOString();
  }
  const at = instantOf(window.date, upBy.time, zone);
  return Date.parse(at) < Date.parse(window.startAt) ? at : window.startAt;
}

export interface OfferContext {
  readonly lots: number;
  /** The first day still open. */
  readonly firstDate: string;
  readonly zone: string;
  readonly booking: 'self' | 'desk';
  /** Null while the rule card is not known, or for a stage that asks for no test. */
  readonly upBy: UpBy | null;
}

export function reasonsFor(window: OfferedWindow, context: OfferContext): OfferReason[] {
  const { lots, firstDate, zone, booking, upBy } = context;
  const later = daysBetween(firstDate, window.date);
  return [
    { code: lots > 1 ? 'roomAll' : 'room', isFor: true, count: window.roomLeft },
    later <= 0 ? { code: 'firstDay', isFor: true } : { code: 'laterDays', isFor: false, count: later },
    ...(upBy === null ? [] : [{ code: 'upBy', isFor: false, at: upByFor(upBy, window, zone) } as const]),
    ...(booking === 'desk' ? [{ code: 'deskPlaces', isFor: false } as const] : []),
  ];
}

/** Windows that cannot be taken, by their reason, in order of time. */
export function refusedByReason(
  windows: readonly OfferedWindow[],
): { why: NonNullable<OfferedWindow['whyNot']>; windows: OfferedWindow[] }[] {
  const reasons = [...new Set(windows.flatMap(({ whyNot }) => (whyNot === null ? [] : [whyNot])))];
  return reasons.map((why) => ({ why, windows: windows.filter(({ whyNot }) => whyNot === why) }));
}

/** A window of a list, to compare and keep. */
export function windowKey({ date, label }: Pick<OfferedWindow, 'date' | 'label'>): string {
  return `${date} ${label}`;
}
