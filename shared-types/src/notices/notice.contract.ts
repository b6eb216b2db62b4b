import { z } from 'zod';
import { id, instant } from '../common/fields.js';
import { done, pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';

/** What happened; each has its words in both languages and its recipients in the server's table. */
export const noticeKinds = [
  'visit-requested',
  'visit-booked',
  'visit-moved',
  'visit-changed',
  'visit-withdrawn',
  'visit-declined',
  'visit-freed',
  'visit-not-reached',
  'visit-restored',
  'visit-first-in-line',
  'test-up',
  'no-longer-up',
  'visit-underway',
  'outcome',
  'correction-opened',
  'correction-fixed',
  'correction-reopened',
  'correction-accepted',
  'comment',
  'consent-asked',
  'consent-given',
  'consent-refused',
  'handover',
  'rule-card-published',
] as const;
export type NoticeKind = (typeof noticeKinds)[number];

export const notice = z.object({
  id,
  kind: z.enum(noticeKinds),
  /** Named values of the words: lot number, window, person. Instants as ISO. */
  params: z.record(z.string(), z.unknown()),
  lotId: id.nullable(),
  visitId: id.nullable(),
  at: instant,
  readAt: instant.nullable(),
});
export type Notice = z.infer<typeof notice>;

export const listNotices = route({
  method: 'GET',
  path: '/api/notices',
  summary: 'The reader’s notices, newest first, and how many are unread',
  status: 200,
  query: z.object(pageQuery),
  answer: pageOf(notice).extend({ unread: z.number().int() }),
});

export const markNoticesRead = route({
  method: 'POST',
  path: '/api/notices/read',
  summary: 'Mark the reader’s notices as read: these, or all',
  status: 200,
  body: z.strictObject({ ids: z.array(id).max(500).optional() }),
  answer: done,
});
