import { describe, expect, it } from 'vitest';
import { readCalendar } from './read-calendar.js';
import { spanOf } from './times.js';

// The first example of RFC 5545, section 4 (from memory), without its people.
const conference = [
  'BEGIN:VCALENDAR',
  'PRODID:-//xyz Corp//NONSGML PDA Calendar Version 1.0//EN',
  'VERSION:2.0',
  'BEGIN:VEVENT',
  'DTSTAMP:19960704T120000Z',
  'UID:uid1@example.com',
  'DTSTART:19960918T143000Z',
  'DTEND:19960920T220000Z',
  'STATUS:CONFIRMED',
  'CATEGORIES:CONFERENCE',
  'SUMMARY:Networld+Interop Conference',
  'DESCRIPTION:Networld+Interop Conference\\nand Exhibit',
  'END:VEVENT',
  'END:VCALENDAR',
].join('\r\n');

/** An entry of the given lines in the form of RFC 5545, 3.6.1. */
function entryOf(...lines: string[]) {
  const text = [
    'BEGIN:VCALENDAR',
    'VERSION:2.0',
    'PRODID:-//t//EN',
    'METHOD:cancel',
    'BEGIN:VEVENT',
    'UID:u@example.test',
  ]
    .concat(lines, 'END:VEVENT', 'END:VCALENDAR')
    .join('\r\n');
  const reading = readCalendar(text);
  if (!reading.isReadable || !reading.entries[0]) throw new Error('not read');
  return { method: reading.method, ...reading.entries[0] };
}

function spanWords(...lines: string[]): string {
  const { start, end } = entryOf(...lines);
  return start ? spanOf(start, end) : '';
}

describe('a calendar file in words', () => {
  it('reads the standard’s example', () => {
    const reading = readCalendar(conference);
    if (!reading.isReadable) throw new Error(reading.problem);
    const [entry] = reading.entries;
    expect(reading.method).toBeNull();
    expect(entry).toMatchObject({
      uid: 'uid1@example.com',
      status: 'CONFIRMED',
      summary: 'Networld+Interop Conference',
      sequence: 0,
    });
    // 1996-09-18 was a Wednesday, 1996-09-20 a Friday.
    expect(entry?.start && spanOf(entry.start, entry.end)).toBe('Wed, Sep 18, 2:30 pm – Fri, Sep 20, 10:00 pm, UTC');
  });

  it('reads place, sequence, people and method, with folded and escaped text', () => {
    expect(
      entryOf(
        'DTSTART:20260415T150000Z',
        'SUMMARY:Lot 17\\, rough-in vi',
        ' sit',
        'LOCATION:418 Sedge Loop',
        'SEQUENCE:3',
        'ORGANIZER;CN=Holdwater:mailto:visits@example.test',
        'ATTENDEE;RSVP=TRUE:mailto:ruben@dunlatch.example.test',
      ),
    ).toMatchObject({
      method: 'CANCEL',
      summary: 'Lot 17, rough-in visit',
      place: '418 Sedge Loop',
      sequence: 3,
      organizer: 'visits@example.test',
      attendees: ['ruben@dunlatch.example.test'],
    });
  });

  it('keeps the clock of the entry’s own zone, given as an end or as a duration', () => {
    const start = 'DTSTART;TZID=America/Denver:20260415T090000';
    const words = 'Wed, Apr 15, 9:00–11:00 am, America/Denver';
    expect(spanWords(start, 'DTEND;TZID=America/Denver:20260415T110000')).toBe(words);
    expect(spanWords(start, 'DURATION:PT2H')).toBe(words);
  });

  it('names both halves, both days and both zones where they differ', () => {
    expect(spanWords('DTSTART:20260415T113000Z', 'DTEND:20260415T130000Z')).toBe(
      'Wed, Apr 15, 11:30 am – 1:00 pm, UTC',
    );
    expect(spanWords('DTSTART:20260415T000000', 'DTEND;TZID=America/Boise:20260416T120000')).toBe(
      'Wed, Apr 15, 12:00 am, floating – Thu, Apr 16, 12:00 pm, America/Boise',
    );
    expect(spanWords('DTSTART;VALUE=DATE:20260415')).toBe('Wed, Apr 15, all day');
  });

  it('says what is no calendar', () => {
    expect(readCalendar('not a calendar')).toMatchObject({ isReadable: false, problem: expect.stringMatching(/./) });
  });
});
