import ical, { ICalAttendeeRole, ICalAttendeeStatus, ICalCalendarMethod, ICalEventStatus } from 'ical-generator';
import type { InviteFacts } from './mail-facts.js';

export interface InviteParts {
  facts: InviteFacts;
  summary: string;
  description: string;
  location: string;
  url: string;
  organizer: { name: string; email: string };
  attendee: { name: string; email: string };
  /** When the invite is made; DTSTAMP, in UTC. */
  stamp: Date;
}

/**
 * The calendar file of a visit (RFC 5545, RFC 5546): one event whose UID stays, times in UTC, the recipient as attendee. A cancellation
 * carries STATUS:CANCELLED and the same UID.
 */
export function inviteOf({
  facts,
  summary,
  description,
  location,
  url,
  organizer,
  attendee,
  stamp,
}: InviteParts): string {
  const isCancel = facts.method === 'CANCEL';
  const calendar = ical({
    prodId: { company: 'Holdwater', product: 'Visits', language: 'EN' },
    method: isCancel ? ICalCalendarMethod.CANCEL : ICalCalendarMethod.REQUEST,
  });
  calendar.createEvent({
    id: facts.uid,
    sequence: facts.sequence,
    stamp,
    start: new Date(facts.startAt),
    end: new Date(facts.endAt),
    summary,
    description,
    location,
    url,
    status: isCancel ? ICalEventStatus.CANCELLED : ICalEventStatus.CONFIRMED,
    organizer,
    attendees: [
      {
        name: attendee.name,
        email: attendee.email,
        role: ICalAttendeeRole.REQ,
        status: ICalAttendeeStatus.NEEDSACTION,
        rsvp: !isCancel,
      },
    ],
  });
  // schemes are written in lower case (RFC 3986 3.1); the library writes this one in capitals, and some readers take it literally
  return calendar.toString().replaceAll(':MAILTO:', ':mailto:');
}
