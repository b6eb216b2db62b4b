import { html } from './html.js';
import type { Html } from './html.js';
import type { MailCalendar } from './mail-types.js';
import { readCalendar } from './read-calendar.js';
import type { CalendarEntry } from './read-calendar.js';
import { spanOf } from './times.js';

const methodWords: Record<string, string> = {
  REQUEST: 'request: puts the entry in, or moves the one with the same UID',
  CANCEL: 'cancel: takes the entry out',
  REPLY: 'reply: an answer to an invite',
  PUBLISH: 'publish: puts the entry in, asks for no answer',
};

/** The calendar file in words, then as it is. */
export function renderCalendar(calendar: MailCalendar): Html {
  const reading = readCalendar(calendar.text);
  return html`<section class="part">
    <h3>The calendar file, in words</h3>
    ${
      reading.isReadable
        ? html`${methodWarning(calendar.method, reading.method)}${reading.entries.map((entry) => entryTable(entry, reading.method))}
          ${reading.entries.length === 0 && html`<p class="fault">The file has no entry.</p>`}`
        : html`<p class="fault">The file cannot be read: ${reading.problem}</p>`
    }
    <details>
      <summary>As it was sent, ${calendar.contentType}${calendar.method && `; method=${calendar.method}`}</summary>
      <pre tabindex="0">${calendar.text}</pre>
    </details>
  </section>`;
}

/** RFC 6047 (2.4): the method of the content type and the one in the file are the same. */
function methodWarning(ofPart: string | null, ofFile: string | null): Html | false {
  return (
    ofPart !== ofFile &&
    html`<p class="fault">
      The part says ${ofPart ?? 'no method'}, the file ${ofFile ?? 'no method'}. They must be the same, or calendars
      ignore it.
    </p>`
  );
}

function entryTable(entry: CalendarEntry, method: string | null): Html {
  const rows: [string, string | Html][] = [
    ['entry', entry.summary],
    ['span', entry.start ? spanOf(entry.start, entry.end) : ''],
    ['place', entry.place],
    ['sequence', html`<span class="n">${entry.sequence}</span>${entry.sequence > 0 && ', after a change'}`],
    ['method', method ? (methodWords[method] ?? method.toLowerCase()) : ''],
    ['status', entry.status.toLowerCase()],
    ['organizer', entry.organizer],
    ['people', entry.attendees.join(', ')],
    ['UID', entry.uid],
  ];
  return html`<table class="words">
    <tbody>
      ${rows.map(
        ([label, value]) =>
          value !== '' &&
          html`<tr>
            <th scope="row">${label}</th>
            <td>${value}</td>
          </tr>`,
      )}
    </tbody>
  </table>`;
}
