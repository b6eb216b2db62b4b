import { html, withLinks } from './html.js';
import type { Html } from './html.js';
import type { StoredMail } from './mail-types.js';
import { renderCalendar } from './page-calendar.js';
import { everybody, pagePath } from './page-lists.js';
import { clockOf, dayOf } from './times.js';

/** A mail opened: who, when, what, then its parts. */
export function renderMail({ envelope, content }: StoredMail, to: string | null): Html {
  const recipients = envelope.recipients.map((address) => {
    const name = content.names.get(address);
    return name ? `${name}, ${address}` : address;
  });
  return html`<article class="mail" aria-label="The email opened">
    <div class="panel">
      <a class="back" href="${pagePath({ to: to ?? everybody })}">Emails</a>
      <h2>${content.subject || 'No subject'}</h2>
    </div>
    <dl class="facts">
      ${fact('From', inWords(content.from) || envelope.sender)} ${fact('To', recipients.join('; '))}
      ${fact('Received', html`${dayOf(envelope.receivedAt)}, ${clockOf(envelope.receivedAt)}`)}
      ${fact('Replies go to', content.replyTo ?? 'the sender')}
    </dl>
    ${content.problem && html`<p class="fault">This email cannot be taken apart: ${content.problem}. Its raw text is kept.</p>`}
    <div class="parts">
      <div>${content.html !== null && htmlPart(content.html)}${content.html === null && textPart(content.text)}</div>
      <div>
        ${content.calendars.map(renderCalendar)} ${content.html !== null && textPart(content.text)}
        ${sentPart({ envelope, content })}
      </div>
    </div>
  </article>`;
}

/** "Name, address" instead of the quoted name and angle brackets of the header. */
function inWords(from: string): string {
  return from.replace(/^"?(.*?)"? <(.*)>$/, '$1, $2');
}

function fact(label: string, value: string | Html): Html {
  return html`<div>
    <dt>${label}</dt>
    <dd>${value}</dd>
  </div>`;
}

/**
 * The mail stands in a frame that runs no script, sends no form and leaves by no link but into a new tab. It shares
 * the page's origin only so that the page can make the frame as high as the mail.
 */
function htmlPart(markup: string): Html {
  const framed = `<!doctype html><base target="_blank"><meta name="viewport" content="width=device-width">${markup}`;
  return html`<section class="part">
    <h3>The email</h3>
    <iframe
      class="frame"
      title="The email"
      referrerpolicy="no-referrer"
      sandbox="allow-same-origin allow-popups allow-popups-to-escape-sandbox"
      srcdoc="${framed}"
    ></iframe>
  </section>`;
}

function textPart(text: string | null): Html {
  return html`<section class="part">
    <h3>The plain text</h3>
    ${text === null ? html`<p class="fault">The email has no plain text.</p>` : html`<pre tabindex="0">${withLinks(text)}</pre>`}
  </section>`;
}

function sentPart({ envelope, content }: StoredMail): Html {
  return html`<section class="part">
    <h3>As it was sent</h3>
    <table class="words">
      <tbody>
        <tr>
          <th scope="row">Message-ID</th>
          <td>${content.messageId ?? 'none'}</td>
        </tr>
        ${content.attachments.map(
          ({ filename, contentType, sizeBytes }) =>
            html`<tr>
              <th scope="row">attached</th>
              <td>${filename ?? 'no name'}, ${contentType}, <span class="n">${sizeBytes}</span> bytes</td>
            </tr>`,
        )}
      </tbody>
    </table>
    <p class="acts">
      <a class="act" href="/api/messages/${envelope.id}/raw" target="_blank" rel="noopener">Open the raw email</a>
    </p>
  </section>`;
}
