import type { Mailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import ICAL from 'ical.js';

export interface Invite {
  to: string;
  messageId: string | null;
  method: string;
  uid: string;
  sequence: number;
  startAt: string;
  endAt: string;
  attendee: string;
}

/** Every calendar entry that was mailed, oldest first, as ical.js reads it: a reader of RFC 5545 that is not ours. */
export function listInvites(mailbox: Mailbox): Invite[] {
  const mails = mailbox.messages().reverse();
  return mails.flatMap(({ to, messageId, calendars }) =>
    calendars.map(({ text }) => ({ to: to.join(), messageId, ...readInvite(text) })),
  );
}

function readInvite(text: string): Omit<Invite, 'to' | 'messageId'> {
  const calendar = new ICAL.Component(ICAL.parse(text));
  const event = calendar.getFirstSubcomponent('vevent');
  if (!event) throw new Error('no event in the calendar file');
  const timeOf = (name: string) => (event.getFirstPropertyValue(name) as ICAL.Time).toJSDate().toISOString();
  return {
    method: String(calendar.getFirstPropertyValue('method')),
    uid: String(event.getFirstPropertyValue('uid')),
    sequence: Number(event.getFirstPropertyValue('sequence')),
    startAt: timeOf('dtstart'),
    endAt: timeOf('dtend'),
    attendee: String(event.getFirstPropertyValue('attendee')),
  };
}
