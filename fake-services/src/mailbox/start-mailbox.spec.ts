import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import type { SendMailOptions } from 'nodemailer';
import { afterEach, describe, expect, it } from 'vitest';
import { startMailbox } from './start-mailbox.js';
import type { Mailbox, MailboxOptions } from './start-mailbox.js';

// Mails are made and sent by nodemailer, which shares no code with the server or its parser.
const running: Mailbox[] = [];
const folders: string[] = [];

afterEach(async () => {
  await Promise.all(running.splice(0).map((mailbox) => mailbox.stop()));
  await Promise.all(folders.splice(0).map((folder) => rm(folder, { recursive: true, force: true })));
});

async function start(options: MailboxOptions = {}): Promise<Mailbox> {
  const mailbox = await startMailbox(options);
  running.push(mailbox);
  return mailbox;
}

async function send(mailbox: Mailbox, mail: SendMailOptions): Promise<void> {
  const transport = createTransport(mailbox.smtpUrl);
  await transport.sendMail({ from: 'Holdwater <visits@example.test>', to: 'ruben@dunlatch.example.test', ...mail });
  transport.close();
}

const invite = [
  'BEGIN:VCALENDAR',
  'VERSION:2.0',
  'PRODID:-//Holdwater//Test//EN',
  'METHOD:REQUEST',
  'BEGIN:VEVENT',
  'UID:visit-17@example.test',
  'DTSTAMP:20260414T150000Z',
  'DTSTART:20260415T150000Z',
  'DTEND:20260415T170000Z',
  'SUMMARY:Lot 17, rough-in visit — Peña',
  'END:VEVENT',
  'END:VCALENDAR',
  '',
].join('\r\n');

describe('the mailbox', () => {
  it('keeps what nodemailer sent, by the envelope and not by the header', async () => {
    const mailbox = await start();
    await send(mailbox, {
      to: 'Ruben Achterberg <Ruben@dunlatch.example.test>',
      bcc: 'desk@tallowmere.example.test',
      replyTo: 'thread-17@example.test',
      subject: 'Lot 17, Sorrel Bench: rough-in visit Wed, Apr 15, 9:00–11:00 am',
      messageId: '<visit-17-1@example.test>',
      text: 'Put the tests up by 7:00 am.\nÑandú.',
      html: '<p>Put the tests up by <b>7:00 am</b>.</p>',
    });
    const [mail] = mailbox.messages();
    expect(mail).toMatchObject({
      from: '"Holdwater" <visits@example.test>',
      to: ['ruben@dunlatch.example.test', 'desk@tallowmere.example.test'],
      replyTo: 'thread-17@example.test',
      subject: 'Lot 17, Sorrel Bench: rough-in visit Wed, Apr 15, 9:00–11:00 am',
      messageId: '<visit-17-1@example.test>',
      html: '<p>Put the tests up by <b>7:00 am</b>.</p>',
      calendars: [],
      attachments: [],
    });
    expect(mail?.text?.trimEnd()).toBe('Put the tests up by 7:00 am.\nÑandú.');
  });

  it('makes up no plain text for a mail that has only HTML', async () => {
    const mailbox = await start();
    await send(mailbox, { subject: 'No twin', html: '<p>Only this</p>' });
    const [mail] = mailbox.messages();
    expect(mail?.text).toBeNull();
    expect(mail?.html?.trimEnd()).toBe('<p>Only this</p>');
  });

  // RFC 6047, 2.4: an invite is a text/calendar part with a method parameter, here an alternative of the text.
  it.each(['base64', 'quoted-printable'] as const)(
    'reads a calendar that is an alternative, in %s',
    async (encoding) => {
      const mailbox = await start();
      await send(mailbox, {
        subject: 'Invite',
        text: 'An invite',
        html: '<p>An invite</p>',
        alternatives: [
          {
            contentType: 'text/calendar; charset=utf-8; method=REQUEST',
            content: invite,
            contentTransferEncoding: encoding,
          },
        ],
      });
      const [mail] = mailbox.messages();
      expect(mail?.calendars).toEqual([{ method: 'REQUEST', contentType: 'text/calendar', text: invite }]);
      expect(mail?.text?.trimEnd()).toBe('An invite');
      const raw = await (await fetch(mail?.rawUrl ?? '')).text();
      expect(raw).toMatch(/multipart\/alternative/);
      expect(raw).not.toContain('— Peña');
    },
  );

  it('reads the invite and the attached copy of nodemailer’s own calendar option', async () => {
    const mailbox = await start();
    await send(mailbox, {
      subject: 'Cancelled',
      text: 'Withdrawn',
      icalEvent: { method: 'CANCEL', filename: 'visit.ics', content: invite.replace('REQUEST', 'CANCEL') },
    });
    const [mail] = mailbox.messages();
    expect(mail?.calendars.map(({ method }) => method)).toEqual(['CANCEL']);
    expect(mail?.attachments).toMatchObject([{ filename: 'visit.ics', contentType: 'application/ics' }]);
  });

  it('reads an attached calendar in another charset, and one without a method', async () => {
    const mailbox = await start();
    const latin = Buffer.from('SUMMARY:Peña', 'latin1');
    await send(mailbox, {
      subject: 'Two files',
      text: 'Two files',
      attachments: [
        { filename: 'a.ics', contentType: 'text/calendar; charset=iso-8859-1; method=publish', content: latin },
        { filename: 'b.ics', contentType: 'text/calendar', content: 'SUMMARY:Sorrel' },
      ],
    });
    expect(mailbox.messages()[0]?.calendars).toEqual([
      { method: 'PUBLISH', contentType: 'text/calendar', text: 'SUMMARY:Peña' },
      { method: null, contentType: 'text/calendar', text: 'SUMMARY:Sorrel' },
    ]);
  });

  it('keeps the bytes as they were sent', async () => {
    const mailbox = await start();
    const raw = 'From: a@example.test\r\nTo: b@example.test\r\nSubject: Raw\r\n\r\n.a dot first\r\n\r\nlast line\r\n';
    await send(mailbox, { envelope: { from: 'a@example.test', to: ['b@example.test'] }, raw });
    const response = await fetch(mailbox.messages()[0]?.rawUrl ?? '');
    expect(await response.text()).toBe(raw);
  });

  it('has every mail again after a restart on the same port and folder', async () => {
    const directory = await mkdtemp(join(tmpdir(), 'mailbox-spec-'));
    folders.push(directory);
    const first = await startMailbox({ directory });
    await send(first, { subject: 'Before', text: 'one' });
    const before = first.messages();
    await first.stop();
    await expect(send(first, { subject: 'Nobody there', text: 'lost' })).rejects.toThrow('ECONNREFUSED');

    const port = (url: string) => Number(new URL(url).port);
    const second = await start({ directory, smtpPort: port(first.smtpUrl), httpPort: port(first.httpUrl) });
    expect(second.messages()).toEqual(before);
    await send(second, { subject: 'After', text: 'two' });
    expect(second.messages().map(({ subject }) => subject)).toEqual(['After', 'Before']);
  });

  it('keeps all of fifty mails sent at once', async () => {
    const mailbox = await start();
    const transport = createTransport({
      pool: true,
      maxConnections: 10,
      host: '127.0.0.1',
      port: Number(new URL(mailbox.smtpUrl).port),
    });
    const numbers = Array.from({ length: 50 }, (_, index) => index);
    await Promise.all(
      numbers.map((number) =>
        transport.sendMail({ from: 'a@example.test', to: 'b@example.test', subject: `Mail ${number}`, text: 'x' }),
      ),
    );
    transport.close();
    const subjects = mailbox.messages().map(({ subject }) => subject);
    expect(new Set(subjects)).toEqual(new Set(numbers.map((number) => `Mail ${number}`)));
    expect(subjects).toHaveLength(50);
  });

  it('waits for a mail, and says so when none comes', async () => {
    const mailbox = await start();
    const waiting = mailbox.waitForMessage({ subject: 'wanted' });
    await send(mailbox, { subject: 'Something else', text: 'x' });
    await send(mailbox, { subject: 'The Wanted one', text: 'x' });
    expect((await waiting).subject).toBe('The Wanted one');
    await expect(mailbox.waitForMessage({ to: 'nobody@example.test' }, 20)).rejects.toThrow('No mail for');
  });
});
