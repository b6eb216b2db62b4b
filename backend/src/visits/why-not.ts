import type { OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';

export type WhyNot = NonNullable<OfferedWindow['whyNot']>;

/** The days open to a request made now. */
export interface OpenDays {
  readonly firstDate: string;
  readonly lastDate: string;
}

export interface WindowToAsk {
  readonly date: string;
  readonly startAt: string;
  readonly isClosed: boolean;
}

/** Why a window cannot be asked for by the time of day alone, in the order a person is told; null when it can. The desk is bound by no open days. */
export function whyNotByTime(window: WindowToAsk, openDays: OpenDays | null, now: Date): WhyNot | null {
  if (window.isClosed) return 'closed';
  if (Date.parse(window.startAt) <= now.getTime()) return 'past';
  if (openDays === null) return null;
  if (window.date < openDays.firstDate) return 'cut-off-passed';
  return window.date > openDays.lastDate ? 'beyond-horizon' : null;
}
