import type { StoredMail } from './mail-types.js';

export interface MailFilter {
  /** An address the mail was delivered to, whole, in any case. */
  to?: string;
  /** ISO 8601 instant or milliseconds since 1970: mails received then or later. */
  since?: string | number | Date;
  /** A part of the subject, in any case. */
  subject?: string;
}

/** A filter that cannot be understood; the message says what is wrong with it. */
export class FilterError extends Error {}

/**
 * Makes the test a filter stands for.
 * @throws FilterError when `since` is no time
 */
export function matcherOf(filter: MailFilter): (mail: StoredMail) => boolean {
  const to = filter.to?.trim().toLowerCase();
  const subject = filter.subject?.toLowerCase();
  const since = filter.since === undefined || filter.since === '' ? null : toMilliseconds(filter.since);
  return ({ envelope, content }) =>
    (!to || envelope.recipients.includes(to)) &&
    (!subject || content.subject.toLowerCase().includes(subject)) &&
    (since === null || Date.parse(envelope.receivedAt) >= since);
}

/** Reads the filter of a query string; parameters it does not know are left alone. */
export function filterFromQuery(query: URLSearchParams): MailFilter {
  return {
    to: query.get('to') ?? undefined,
    since: query.get('since') ?? undefined,
    subject: query.get('subject') ?? undefined,
  };
}

function toMilliseconds(since: string | number | Date): number {
  const isNumeric = typeof since === 'string' && /^\d+$/.test(since);
  const milliseconds = isNumeric ? Number(since) : new Date(since).getTime();
  if (Number.isNaN(milliseconds)) {
    throw new FilterError('"since" is not a time: give an instant such as 2026-04-15T15:00:00Z, or milliseconds.');
  }
  return milliseconds;
}
