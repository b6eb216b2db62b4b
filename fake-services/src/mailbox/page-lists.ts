import { html } from './html.js';
import type { Html } from './html.js';
import type { StoredMail } from './mail-types.js';
import { clockOf, dayOf } from './times.js';

/** What the page is asked for. */
export interface PageRequest {
  /** The recipient whose mails are listed; `everybody`, or null before one is chosen, lists all. */
  to: string | null;
  /** The mail that is opened. */
  id: string | null;
  /** How many mails are listed. */
  limit: number;
}

export const everybody = '*';
export const mailsPerPage = 100;

/** The address of the page for a request, as a path. */
export function pagePath({ to, id, limit }: Partial<PageRequest>): string {
  const query = new URLSearchParams();
  if (to) query.set('to', to);
  if (id) query.set('id', id);
  if (limit && limit !== mailsPerPage) query.set('limit', String(limit));
  const text = query.toString();
  return text ? `/?${text}` : '/';
}

interface Recipient {
  address: string;
  name: string;
  count: number;
}

/** Everybody who got a mail, by name; the name is the one of the newest mail that has one. */
export function recipientsOf(mails: StoredMail[]): Recipient[] {
  const recipients = new Map<string, Recipient>();
  for (const { envelope, content } of mails) {
    for (const address of envelope.recipients) {
      const known = recipients.get(address) ?? { address, name: '', count: 0 };
      known.name ||= content.names.get(address) ?? '';
      known.count += 1;
      recipients.set(address, known);
    }
  }
  return [...recipients.values()].sort((one, other) =>
    (one.name || one.address).localeCompare(other.name || other.address),
  );
}

export function renderRecipients(recipients: Recipient[], total: number, to: string | null): Html {
  const row = (address: string, name: string, second: string, count: number) =>
    html` <li>
      <a class="row${address === to ? ' on' : ''}" href="${pagePath({ to: address })}" ${current(address === to)}>
        <span class="grow"><b>${name}</b>${second && html`<span class="second">${second}</span>`}</span>
        <span class="n">${count}</span>
      </a>
    </li>`;
  return html`<nav class="recipients" aria-label="Recipients">
    <div class="panel"><h2>Recipients</h2></div>
    <ul>
      ${row(everybody, 'Everybody', '', total)}
      ${recipients.map(({ address, name, count }) => row(address, name || address, name && address, count))}
    </ul>
  </nav>`;
}

/** The mails under their days, newest first. */
export function renderMails(mails: StoredMail[], request: PageRequest, openId: string | null, heading: string): Html {
  const shown = mails.slice(0, request.limit);
  const days = [...new Set(shown.map(({ envelope }) => dayOf(envelope.receivedAt)))];
  const older = mails.length - shown.length;
  return html`<nav class="mails" aria-label="Emails">
    <div class="panel">
      <a class="back" href="/">Recipients</a>
      <h2>${heading}</h2>
    </div>
    ${mails.length === 0 && html`<p class="plain">No email for this address.</p>`}
    ${days.map(
      (day) =>
        html`<h3 class="day">${day}</h3>
          <ul>
            ${shown.filter(({ envelope }) => dayOf(envelope.receivedAt) === day).map((mail) => mailRow(mail, request, openId))}
          </ul>`,
    )}
    ${
      older > 0 &&
      html`<p class="plain">
        <a href="${pagePath({ ...request, limit: request.limit + mailsPerPage })}">Show older, ${older} more</a>
      </p>`
    }
  </nav>`;
}

function mailRow({ envelope, content }: StoredMail, request: PageRequest, openId: string | null): Html {
  const isOpen = envelope.id === openId;
  const others = envelope.recipients.map((address) => content.names.get(address) ?? address).join(', ');
  const method = content.calendars[0]?.method;
  return html`<li>
    <a class="row${isOpen && ' on'}" href="${pagePath({ ...request, id: envelope.id })}" ${current(isOpen)}>
      <span class="grow"
        ><b>${content.subject || 'No subject'}</b>
        <span class="second"
          >${(request.to ?? everybody) === everybody && html`${others}<br />`}${method && html`calendar file: ${method.toLowerCase()}`}</span
        ></span
      >
      <span class="at">${clockOf(envelope.receivedAt)}</span>
    </a>
  </li>`;
}

function current(is: boolean): Html | false {
  return is && html`aria-current="true"`;
}
