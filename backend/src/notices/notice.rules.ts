import type { NoticeKind } from '@holdwater/shared-types/notices/notice.contract.js';

/** Who stands in what relation to what happened. */
export type Audience =
  'superintendents' | 'plumbers' | 'inspector' | 'opener' | 'desk' | 'asked' | 'former' | 'requester';

export interface NoticeRule {
  /** Who sees it on the page. */
  readonly page: readonly Audience[];
  /** Who is mailed at once. */
  readonly email: readonly Audience[];
  /** Mailed only while no visit of the lot is near: then they will talk about it there. */
  readonly emailWhenNoVisit?: readonly Audience[];
  /** What the mail does to the calendar entry of the visit. */
  readonly calendar?: 'request' | 'cancel';
}

/**
 * Event → who → channels. The people who must be there get the invite: superintendents, plumbers and the inspector; the desk has its
 * board and is not invited to every visit. Text messages come with their own channel.
 */
export const noticeRules: Readonly<Record<NoticeKind, NoticeRule>> = {
  'visit-requested': { page: ['desk', 'superintendents', 'plumbers'], email: ['desk'] },
  'visit-booked': {
    page: ['superintendents', 'plumbers', 'inspector', 'desk'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'request',
  },
  'visit-moved': {
    page: ['superintendents', 'plumbers', 'inspector', 'desk'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'request',
  },
  'visit-changed': {
    page: ['superintendents', 'plumbers', 'inspector'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'request',
  },
  'visit-withdrawn': {
    page: ['superintendents', 'plumbers', 'inspector', 'desk'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'cancel',
  },
  'visit-declined': {
    page: ['superintendents', 'plumbers'],
    email: ['superintendents', 'plumbers'],
    calendar: 'cancel',
  },
  'visit-freed': {
    page: ['superintendents', 'plumbers', 'inspector', 'desk'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'cancel',
  },
  'visit-not-reached': {
    page: ['superintendents', 'plumbers', 'inspector'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'cancel',
  },
  'visit-restored': {
    page: ['superintendents', 'plumbers', 'inspector', 'desk'],
    email: ['superintendents', 'plumbers', 'inspector'],
    calendar: 'request',
  },
  'visit-first-in-line': {
    page: ['superintendents', 'plumbers', 'desk'],
    email: ['superintendents', 'plumbers', 'desk'],
  },
  'test-up': { page: ['superintendents', 'inspector'], email: [] },
  'no-longer-up': { page: ['superintendents', 'inspector', 'plumbers'], email: [] },
  'visit-underway': { page: ['superintendents', 'plumbers'], email: [] },
  outcome: { page: ['superintendents', 'plumbers', 'desk'], email: ['superintendents', 'plumbers', 'inspector'] },
  'correction-opened': { page: ['superintendents', 'plumbers'], email: [] },
  'correction-fixed': { page: ['superintendents', 'opener'], email: [], emailWhenNoVisit: ['opener'] },
  'correction-reopened': { page: ['superintendents', 'plumbers'], email: [], emailWhenNoVisit: ['plumbers'] },
  'correction-accepted': { page: ['superintendents', 'plumbers'], email: [], emailWhenNoVisit: ['plumbers'] },
  comment: { page: ['superintendents', 'plumbers', 'inspector', 'desk'], email: [] },
  'consent-asked': { page: ['asked'], email: ['asked'] },
  'consent-given': { page: ['superintendents'], email: [] },
  'consent-refused': { page: ['superintendents'], email: ['superintendents'] },
  // definitions, notices: "handover (both plumbers, department)"
  handover: { page: ['former', 'superintendents', 'plumbers', 'desk'], email: ['former', 'plumbers', 'desk'] },
  'rule-card-published': {
    page: ['superintendents', 'plumbers', 'inspector', 'desk'],
    email: ['superintendents', 'plumbers'],
  },
};

export interface Channels {
  readonly page: boolean;
  readonly email: boolean;
}

/**
 * Each person once, with their channels. The one who did it is not told of it on the page; an invite they get all the same, since it is
 * their calendar too.
 */
export function recipientsOf(
  kind: NoticeKind,
  people: Readonly<Partial<Record<Audience, readonly string[]>>>,
  actorId: string | null,
  hasOpenVisit: boolean,
): Map<string, Channels> {
  const rule = noticeRules[kind];
  const mailed = [...rule.email, ...(hasOpenVisit ? [] : (rule.emailWhenNoVisit ?? []))];
  const ids = (audiences: readonly Audience[]) => audiences.flatMap((audience) => people[audience] ?? []);
  const recipients = new Map<string, Channels>();
  for (const id of ids(rule.page)) if (id !== actorId) recipients.set(id, { page: true, email: false });
  for (const id of ids(mailed)) {
    if (id === actorId && rule.calendar === undefined) continue;
    recipients.set(id, { page: recipients.get(id)?.page ?? false, email: true });
  }
  return recipients;
}
