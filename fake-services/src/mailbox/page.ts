import type { Scenario } from './control.js';
import { html } from './html.js';
import type { Html } from './html.js';
import type { StoredMail } from './mail-types.js';
import { everybody, recipientsOf, renderMails, renderRecipients } from './page-lists.js';
import type { PageRequest } from './page-lists.js';
import { renderMail } from './page-mail.js';
import { pageZone } from './times.js';

/** Everything the page shows; `mails` are all there are, newest first. */
export interface PageContent {
  mails: StoredMail[];
  request: PageRequest;
  scenario: Scenario;
  smtpUrl: string;
}

/** The whole page. On a phone one of its three panels shows, by what is asked for. */
export function renderPage({ mails, request, scenario, smtpUrl }: PageContent): string {
  const chosen = request.to ?? everybody;
  const listed = chosen === everybody ? mails : mails.filter(({ envelope }) => envelope.recipients.includes(chosen));
  const opened = request.id === null ? listed[0] : mails.find(({ envelope }) => envelope.id === request.id);
  const recipients = recipientsOf(mails);
  const heading =
    recipients.find(({ address }) => address === chosen)?.name || (chosen === everybody ? 'Everybody' : chosen);
  const head = renderHead(mails.length, recipients.length, scenario, smtpUrl);
  if (mails.length === 0) return document(html`${head}${nothingYet(smtpUrl)}`, 'empty', '');
  return document(
    html`${head}
      <main class="panels">
        ${renderRecipients(recipients, mails.length, chosen)}
        ${renderMails(listed, { ...request, to: chosen }, opened?.envelope.id ?? null, heading)}
        ${opened ? renderMail(opened, chosen) : request.id !== null ? noSuchMail : html`<div class="mail"></div>`}
      </main>`,
    request.id !== null ? 'mail' : request.to !== null ? 'mails' : 'recipients',
    mails[0]?.envelope.id ?? '',
  );
}

const modeWords: Record<Scenario['mode'], string> = {
  accept: 'every email is taken',
  'refuse-connections': 'connections refused, 421',
  'temporary-failure': 'put off, 451',
  'reject-recipient': 'rejected, 550',
  slow: 'slow',
};

function renderHead(mailCount: number, recipientCount: number, scenario: Scenario, smtpUrl: string): Html {
  const { mode, recipients, delayMs } = scenario;
  const about = recipients.length > 0 ? `: ${recipients.join(', ')}` : '';
  const wait = mode === 'slow' ? `, ${delayMs} ms` : '';
  return html`<header>
    <div class="top"><a class="brand" href="/">${brandMark}Holdwater</a></div>
    <div class="hd">
      <div class="c t">
        <span class="lab">Holdwater</span>
        <h1 class="v">Demo mailbox</h1>
      </div>
      <div class="c"><span class="lab">Emails</span><span class="v n">${mailCount}</span></div>
      <div class="c"><span class="lab">Recipients</span><span class="v n">${recipientCount}</span></div>
      <div class="c"><span class="lab">Times in</span><span class="v">${pageZone}</span></div>
      <div class="c wide">
        <span class="lab">${smtpUrl}</span
        ><span class="v${mode !== 'accept' && ' bad'}">${modeWords[mode]}${wait}${about}</span>
      </div>
      <div class="c x">
        <span role="status"><a class="act" id="fresh" href="/" hidden>New email: show it</a></span>
      </div>
    </div>
  </header>`;
}

function nothingYet(smtpUrl: string): Html {
  return html`<main class="plain">
    <h2>No email yet</h2>
    <p>
      Email sent to ${smtpUrl} is kept here and goes no further. Book a visit or ask for a sign-in link, and it shows
      up.
    </p>
  </main>`;
}

const noSuchMail = html`<div class="mail plain">
  <h2>No such email</h2>
  <p>It was deleted, or the address is mistyped. The emails still here are in the list. <a href="/">Show all</a></p>
</div>`;

const brandMark = html`<svg width="28" height="28" viewBox="0 0 28 28" aria-hidden="true">
  <path d="M6 12h8v14H6z" fill="#9FCDE6" />
  <path d="M5.2 2v24.5M14.8 2v24.5" stroke="#1C1A22" stroke-width="1.8" />
  <path d="M3 18.5h14V23H3z" fill="#5B2C90" />
  <path d="M6 11.5h20.5" stroke="#0A659B" stroke-width="2" />
  <path d="M17 3.5h8.6l-4.3 6.9Z" fill="none" stroke="#0A659B" stroke-width="1.9" stroke-linejoin="round" />
  <path d="M18.5 15h5.6M20.2 18.3h2.2" stroke="#0A659B" stroke-width="1.7" />
</svg>`;

/** @param view the panel a phone shows; @param newest id of the newest mail, so that the page can tell of newer ones */
function document(content: Html, view: string, newest: string): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>Demo mailbox, Holdwater</title>
        <link rel="icon" href="data:," />
        <link rel="stylesheet" href="/mailbox.css" />
      </head>
      <body data-view="${view}" data-newest="${newest}">
        <div class="sheet">${content}</div>
        <script src="/mailbox.js"></script>
      </body>
    </html>`.markup;
}
