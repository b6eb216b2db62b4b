import type { NoticeKind } from '@holdwater/shared-types/notices/notice.contract.js';

/** Facts of a visit at the moment of the event: what its calendar entry said then, so that a late mail tells the truth of its time. */
export interface VisitEventFacts {
  startAt: string;
  endAt: string;
  /** Set where an invite or a cancellation goes out; the SEQUENCE of that moment. */
  calendarSequence: number;
  inspectorName: string | null;
  plannedStartAt: string | null;
  /** An inspector the visit was taken from (moved to another, not reached): their calendar entry goes too. */
  formerInspectorId?: string | null;
}

type VisitEvent = { visit: VisitEventFacts };

/** Every event of the outbox and what it carries. Those that are notices bear the notice's own name. */
export interface OutboxPayloads extends Record<NoticeKind, object> {
  'visit-requested': VisitEvent;
  'visit-booked': VisitEvent;
  'visit-moved': VisitEvent & { from: { startAt: string; endAt: string }; isBooked: boolean };
  /** What its calendar entry says is other than it was, at the same time: another address, other parties. */
  'visit-changed': VisitEvent;
  'visit-withdrawn': VisitEvent & { reason: string; wasBooked: boolean };
  'visit-declined': VisitEvent & { reason: string };
  'visit-freed': VisitEvent & { reason: string };
  'visit-not-reached': VisitEvent;
  'visit-restored': VisitEvent;
  'visit-first-in-line': VisitEvent;
  'test-up': VisitEvent;
  'no-longer-up': VisitEvent;
  'visit-underway': VisitEvent;
  outcome: VisitEvent & { kind: string; reason: string | null };
  'correction-opened': { correctionId: string; number: number };
  'correction-fixed': { correctionId: string; number: number };
  'correction-reopened': { correctionId: string; number: number; why: string };
  'correction-accepted': { correctionId: string; number: number };
  comment: { commentId: string; excerpt: string };
  /** `lotCount` lots at once, the event's own lot being the first of them. */
  'consent-asked': { organizationId: string; kind: string; lotCount: number };
  'consent-given': { organizationId: string; kind: string; lotCount: number };
  'consent-refused': { organizationId: string; kind: string; why: string | null; lotCount: number };
  /** A lot went from one builder or plumber to another. */
  handover: {
    party: 'builder' | 'plumber';
    organizationId: string;
    organizationName: string;
    formerId: string;
    formerName: string;
    takenOver: number;
  };
  'rule-card-published': { ruleCardId: string; departmentId: string; version: number; effectiveFrom: string };
  /** Mail of an account to one address. The link's secret is sealed, never readable in the table. */
  'account-mail': {
    mail: 'sign-in-link' | 'password-reset' | 'invitation' | 'password-changed' | 'session-reused';
    address: string;
    name: string;
    locale: string;
    sealedToken: string | null;
    organizationName: string | null;
    invitedByName: string | null;
  };
}
