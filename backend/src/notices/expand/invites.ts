import { noticeRules } from '../notice.rules.js';
import type { VisitEventFacts } from '../outbox.kinds.js';
import type { InviteFacts } from '../mail/mail-facts.js';
import type { EventSubject } from './event-words.js';

interface Invited {
  personId: string;
  address: string;
}

export interface Invites {
  /** What this mail does to the reader's calendar entry; null where it has none to do. */
  of(personId: string): InviteFacts | null;
  /** Who had the entry and gets no mail of this event: theirs is cancelled by a mail of its own. */
  leftBehind: Invited[];
}

/**
 * Invites of an event: a request to everyone mailed, a cancellation to whoever has the entry by an earlier mail of ours. Only booked visits
 * have entries: a move of a mere request touches no calendar.
 */
export function invitesOf(subject: EventSubject, mailedIds: readonly string[], invited: readonly Invited[]): Invites {
  const rule = noticeRules[subject.kind].calendar;
  const none: Invites = { of: () => null, leftBehind: [] };
  if (!rule || !subject.visit || (subject.kind === 'visit-moved' && subject.event.payload.isBooked === false))
    return none;
  const has = new Set(invited.map(({ personId }) => personId));
  const leftBehind = invited.filter(({ personId }) => !mailedIds.includes(personId));
  if (rule === 'request') return { of: () => facts(subject, 'REQUEST'), leftBehind };
  return { of: (personId) => (has.has(personId) ? facts(subject, 'CANCEL') : null), leftBehind };
}

/** Takes the entry out of the calendar of somebody no longer concerned. */
export function cancellationOf(subject: EventSubject): InviteFacts | null {
  return facts(subject, 'CANCEL');
}

function facts(subject: EventSubject, method: InviteFacts['method']): InviteFacts | null {
  const visit = subject.event.payload.visit as VisitEventFacts | undefined;
  if (!visit || !subject.visit) return null;
  const { startAt, endAt, calendarSequence } = visit;
  return { method, uid: subject.visit.calendarUid, sequence: calendarSequence, startAt, endAt };
}
