import { connect } from 'node:net';
import { createInterface } from 'node:readline';
import { createTransport } from 'nodemailer';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { startMailbox } from './start-mailbox.js';
import type { Mailbox } from './start-mailbox.js';

// Reply codes: RFC 5321, 4.2.3. What nodemailer makes of them is what the product will see.
let mailbox: Mailbox;

beforeAll(async () => {
  mailbox = await startMailbox();
});

afterEach(async () => {
  mailbox.setScenario({ mode: 'accept' });
  await mailbox.clear();
});

afterAll(() => mailbox.stop());

async function send(to = 'ruben@dunlatch.example.test', options: { socketTimeout?: number } = {}) {
  const transport = createTransport({ host: '127.0.0.1', port: Number(new URL(mailbox.smtpUrl).port), ...options });
  try {
    return await transport.sendMail({ from: 'visits@example.test', to, subject: 'Scenario', text: 'x' });
  } finally {
    transport.close();
  }
}

async function firstLine(): Promise<string> {
  const socket = connect(Number(new URL(mailbox.smtpUrl).port), '127.0.0.1');
  try {
    for await (const line of createInterface(socket)) return line;
    return '';
  } finally {
    socket.destroy();
  }
}

describe('scenarios', () => {
  it('accepts with any sign-in', async () => {
    expect(await firstLine()).toMatch(/^220 /);
    const transport = createTransport(mailbox.smtpUrl.replace('//', '//somebody:secret@'));
    await transport.sendMail({ from: 'visits@example.test', to: 'a@example.test', subject: 'Signed in', text: 'x' });
    transport.close();
    expect(mailbox.messages()).toHaveLength(1);
  });

  it('refuse-connections answers 421 on connect', async () => {
    mailbox.setScenario({ mode: 'refuse-connections' });
    expect(await firstLine()).toMatch(/^421 /);
    await expect(send()).rejects.toMatchObject({ responseCode: 421 });
    expect(mailbox.messages()).toEqual([]);
    mailbox.setScenario({ mode: 'accept' });
    await send();
    expect(mailbox.messages()).toHaveLength(1);
  });

  it('refuse-connections refuses a connection kept open too', async () => {
    const port = Number(new URL(mailbox.smtpUrl).port);
    const transport = createTransport({ pool: true, maxConnections: 1, maxRequeues: 0, host: '127.0.0.1', port });
    const mail = { from: 'visits@example.test', to: 'a@example.test', subject: 'Pooled', text: 'x' };
    await transport.sendMail(mail);
    mailbox.setScenario({ mode: 'refuse-connections' });
    await expect(transport.sendMail(mail)).rejects.toThrow();
    transport.close();
    expect(mailbox.messages()).toHaveLength(1);
  });

  it('temporary-failure answers 451 to the data, for the named only', async () => {
    mailbox.setScenario({ mode: 'temporary-failure' });
    await expect(send()).rejects.toMatchObject({ responseCode: 451, command: 'DATA' });
    mailbox.setScenario({ mode: 'temporary-failure', recipients: ['Desk@tallowmere.example.test'] });
    await expect(send('desk@tallowmere.example.test')).rejects.toMatchObject({ responseCode: 451 });
    await send();
    expect(mailbox.messages().map(({ to }) => to)).toEqual([['ruben@dunlatch.example.test']]);
  });

  it('reject-recipient answers 550 to the listed recipients and takes the others', async () => {
    mailbox.setScenario({ mode: 'reject-recipient', recipients: ['gone@example.test'] });
    await expect(send('gone@example.test')).rejects.toMatchObject({ responseCode: 550, command: 'RCPT TO' });
    const info = await send('gone@example.test, here@example.test');
    expect(info.rejected).toEqual(['gone@example.test']);
    expect(mailbox.messages().map(({ to }) => to)).toEqual([['here@example.test']]);
  });

  it('slow answers after the delay', async () => {
    mailbox.setScenario({ mode: 'slow', delayMs: 150 });
    const before = performance.now();
    await send();
    // A timer may fire a millisecond early by this clock.
    expect(performance.now() - before).toBeGreaterThanOrEqual(149);
    expect(mailbox.messages()).toHaveLength(1);
  });

  it('slow keeps no mail of a client that gave up', async () => {
    mailbox.setScenario({ mode: 'slow', delayMs: 60_000 });
    await expect(send('a@example.test', { socketTimeout: 100 })).rejects.toMatchObject({ code: 'ETIMEDOUT' });
    mailbox.setScenario({ mode: 'accept' });
    await send('b@example.test');
    expect(mailbox.messages().map(({ to }) => to)).toEqual([['b@example.test']]);
  });

  it('stops at once though an answer is being held back', async () => {
    const other = await startMailbox();
    other.setScenario({ mode: 'slow', delayMs: 600_000 });
    const transport = createTransport(other.smtpUrl);
    const sending = transport.sendMail({ from: 'a@example.test', to: 'b@example.test', subject: 'Held', text: 'x' });
    const outcome = expect(sending).rejects.toThrow();
    await other.stop();
    await outcome;
    expect(other.messages()).toEqual([]);
    transport.close();
  });
});
