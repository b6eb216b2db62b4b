import { request } from 'node:http';
import { createTransport } from 'nodemailer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { mailboxModes } from './control.js';
import type { MailView } from './mail-types.js';
import { startMailbox } from './start-mailbox.js';
import type { Mailbox } from './start-mailbox.js';

let mailbox: Mailbox;

beforeAll(async () => {
  mailbox = await startMailbox();
  const transport = createTransport(mailbox.smtpUrl);
  for (const [to, subject] of [
    ['ruben@dunlatch.example.test', 'Lot 17: booked'],
    ['della@odderly.example.test', 'Lot 17: booked'],
    ['ruben@dunlatch.example.test', 'Lot 18: window freed'],
  ]) {
    await transport.sendMail({ from: 'visits@example.test', to, subject, text: 'x' });
  }
  transport.close();
});

afterAll(() => mailbox.stop());

async function call(path: string, init?: RequestInit): Promise<{ status: number; body: unknown }> {
  const response = await fetch(mailbox.httpUrl + path, init);
  return { status: response.status, body: await response.json() };
}

async function list(query: string): Promise<MailView[]> {
  const { status, body } = await call(`/api/messages${query}`);
  expect(status).toBe(200);
  return (body as { messages: MailView[] }).messages;
}

const post = (body: unknown) => ({
  method: 'POST',
  headers: { 'content-type': 'application/json' },
  body: typeof body === 'string' ? body : JSON.stringify(body),
});

describe('the API', () => {
  it('tells its health', async () => {
    expect(await call('/api/health')).toEqual({ status: 200, body: { ok: true } });
  });

  it('lists newest first, by recipient, subject and time', async () => {
    const all = await list('');
    expect(all.map(({ subject }) => subject)).toEqual(['Lot 18: window freed', 'Lot 17: booked', 'Lot 17: booked']);
    expect(all).toEqual(mailbox.messages());
    expect(await list('?to=RUBEN@dunlatch.example.test')).toHaveLength(2);
    expect(await list('?to=dunlatch.example.test')).toEqual([]);
    expect(await list('?to=ruben@dunlatch.example.test&subject=BOOKED')).toHaveLength(1);
    const newest = all[0]?.receivedAt ?? '';
    expect((await list(`?since=${newest}`))[0]?.id).toBe(all[0]?.id);
    expect(await list(`?since=${Date.parse(newest) + 1}`)).toEqual([]);
    expect(await list('?since=2000-01-01T00:00:00Z')).toHaveLength(3);
    expect(await call('/api/messages?since=yesterday')).toMatchObject({ status: 400, body: { code: 'wrong-filter' } });
  });

  it('tells one mail and its raw text', async () => {
    const [newest] = await list('');
    expect((await call(`/api/messages/${newest?.id}`)).body).toEqual(newest);
    const raw = await fetch(newest?.rawUrl ?? '');
    expect(raw.headers.get('content-type')).toBe('text/plain; charset=utf-8');
    expect(await raw.text()).toContain('Subject: Lot 18: window freed\r\n');
  });

  it.each(['/api/messages/none', '/api/messages/none/raw', '/api/messages/..%2f..%2fetc%2fpasswd/raw', '/nothing'])(
    'answers 404 at %s',
    async (path) => {
      expect(await call(path)).toMatchObject({ status: 404, body: { code: 'not-found' } });
    },
  );

  it('answers 405 with what is allowed', async () => {
    const response = await fetch(`${mailbox.httpUrl}/api/messages`, { method: 'PUT' });
    expect([response.status, response.headers.get('allow')]).toEqual([405, 'GET, DELETE']);
  });

  it('is not read under a name of somebody else', async () => {
    const status = await new Promise((resolve, reject) => {
      request(`${mailbox.httpUrl}/api/messages`, { headers: { host: 'elsewhere.example.test' } }, (response) => {
        response.resume();
        resolve(response.statusCode);
      })
        .on('error', reject)
        .end();
    });
    expect(status).toBe(403);
  });

  it('sets and tells the scenario', async () => {
    for (const mode of mailboxModes) {
      const wanted = { mode, recipients: ['a@example.test'], delayMs: mode === 'slow' ? 5 : 0 };
      expect(await call('/api/control', post(wanted))).toEqual({ status: 200, body: wanted });
      expect((await call('/api/control')).body).toEqual(wanted);
    }
  });

  it.each([
    ['an unknown mode', { mode: 'explode' }],
    ['no object', []],
    ['a rejection of nobody', { mode: 'reject-recipient' }],
    ['recipients that are no list', { mode: 'accept', recipients: 'a@example.test' }],
    ['a delay below nothing', { mode: 'slow', delayMs: -1 }],
  ])('refuses %s and keeps the scenario', async (_name, wanted) => {
    await call('/api/control', post({ mode: 'accept' }));
    expect(await call('/api/control', post(wanted))).toMatchObject({ status: 400, body: { code: 'wrong-scenario' } });
    expect((await call('/api/control')).body).toMatchObject({ mode: 'accept' });
  });

  it('refuses what is no JSON, or too much of it', async () => {
    expect((await call('/api/control', post('{'))).status).toBe(400);
    expect((await call('/api/control', post(`"${'x'.repeat(70_000)}"`))).status).toBe(413);
    expect((await call('/api/control', { method: 'POST', body: '{"mode":"accept"}' })).status).toBe(415);
  });

  it('deletes every mail', async () => {
    const [newest] = await list('');
    expect((await call('/api/messages', { method: 'DELETE' })).body).toEqual({ deleted: 3 });
    expect(await list('')).toEqual([]);
    expect((await call(`/api/messages/${newest?.id}/raw`)).status).toBe(404);
  });
});
