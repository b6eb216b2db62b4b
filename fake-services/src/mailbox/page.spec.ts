import { createTransport } from 'nodemailer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startMailbox } from './start-mailbox.js';
import type { Mailbox } from './start-mailbox.js';

let mailbox: Mailbox;
const attack = '<script>alert(1)</script>"><img src=x onerror=alert(2)>';

beforeAll(async () => {
  mailbox = await startMailbox();
});

afterAll(() => mailbox.stop());

async function send(to: string, subject: string, more: { text?: string; html?: string; calendar?: string } = {}) {
  const transport = createTransport(mailbox.smtpUrl);
  const { text = 'x', html, calendar } = more;
  const alternatives = calendar ? [{ contentType: 'text/calendar; method=REQUEST', content: calendar }] : [];
  await transport.sendMail({ from: 'visits@example.test', to, subject, text, html, alternatives });
  transport.close();
}

async function page(query = ''): Promise<{ status: number; markup: string; policy: string }> {
  const response = await fetch(`${mailbox.httpUrl}/${query}`);
  return {
    status: response.status,
    markup: await response.text(),
    policy: response.headers.get('content-security-policy') ?? '',
  };
}

describe('the page', () => {
  it('says that there is nothing yet', async () => {
    expect((await page()).markup).toContain('No email yet');
  });

  it('lists who got how many, and opens the newest or the one asked for', async () => {
    await send('Ruben Achterberg <ruben@dunlatch.example.test>', 'Lot 17: booked', { text: 'first text' });
    await send('ruben@dunlatch.example.test', 'Lot 18: window freed', { text: 'second text' });
    await send('della@odderly.example.test', 'Lot 17: booked for Della', { text: 'third text' });
    const all = (await page()).markup;
    expect(all).toMatch(/Ruben Achterberg<\/b\s*>[\s\S]*?<span class="n">2<\/span>/);
    expect(all).toContain('third text');
    const ruben = (await page('?to=ruben@dunlatch.example.test')).markup;
    expect(ruben).toContain('second text');
    expect(ruben).not.toContain('booked for Della');
    const [first] = mailbox.messages({ subject: 'Lot 17: booked' }).slice(-1);
    expect((await page(`?id=${first?.id}`)).markup).toContain('first text');
    expect(await page('?id=none')).toMatchObject({ status: 404, markup: expect.stringContaining('No such email') });
  });

  it('shows what a stranger wrote as text, and a mail’s markup only in the closed frame', async () => {
    const calendar = `BEGIN:VCALENDAR\r\nMETHOD:REQUEST\r\nBEGIN:VEVENT\r\nUID:u\r\nDTSTART:20260415T150000Z\r\nSUMMARY:${attack}\r\nEND:VEVENT\r\nEND:VCALENDAR\r\n`;
    await send(`"${attack.replaceAll('"', '')}" <x@example.test>`, attack, {
      text: `${attack} see https://holdwater.example.test/lots/17?a=1&b=2.`,
      html: `<p>${attack}</p>`,
      calendar,
    });
    const { markup, policy } = await page();
    expect(markup).not.toContain('<script>alert');
    expect(markup).not.toMatch(/<img\b/);
    expect(markup.match(/&lt;script&gt;alert/g)?.length).toBeGreaterThan(5);
    expect(markup).toContain(
      '<a href="https://holdwater.example.test/lots/17?a=1&amp;b=2" target="_blank" rel="noopener noreferrer"',
    );
    expect(markup).toMatch(/sandbox="allow-same-origin allow-popups allow-popups-to-escape-sandbox"/);
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("script-src 'self';");
  });

  it('tells the calendar file in words, and when its method is not the part’s', async () => {
    const calendar = `BEGIN:VCALENDAR\r\nMETHOD:CANCEL\r\nBEGIN:VEVENT\r\nUID:u\r\nSEQUENCE:2\r\nDTSTART;TZID=America/Denver:20260415T090000\r\nDTEND;TZID=America/Denver:20260415T110000\r\nSUMMARY:Lot 17\r\nLOCATION:418 Sedge Loop\r\nEND:VEVENT\r\nEND:VCALENDAR\r\n`;
    await send('ruben@dunlatch.example.test', 'Invite', { calendar });
    const { markup } = await page();
    expect(markup).toContain('Wed, Apr 15, 9:00–11:00 am, America/Denver');
    expect(markup).toContain('418 Sedge Loop');
    expect(markup).toContain('takes the entry out');
    expect(markup.replace(/\s+/g, ' ')).toContain('The part says REQUEST, the file CANCEL.');
  });

  it('serves its own files and nothing from elsewhere', async () => {
    const files = [...(await page()).markup.matchAll(/(?:href|src)="([^"]+)"/g)].map(([, address]) => address ?? '');
    expect(files).toContain('/mailbox.css');
    expect(files).toContain('/mailbox.js');
    expect(files.filter((address) => !address.startsWith('/') && address !== 'data:,')).toEqual([]);
    for (const file of ['/mailbox.css', '/mailbox.js']) expect((await fetch(mailbox.httpUrl + file)).status).toBe(200);
  });
});
