import type { AddressInfo } from 'node:net';
import { buffer } from 'node:stream/consumers';
import { setTimeout as delay } from 'node:timers/promises';
import { SMTPServer } from 'smtp-server';
import type { SMTPServerDataStream, SMTPServerSession } from 'smtp-server';
import type { Control } from './control.js';
import type { MessageStore } from './message-store.js';

const largestMailBytes = 25 * 1024 * 1024;
/** How long a mail that is being sent may take to finish once the server is told to stop. */
const closeGraceMs = 250;

export interface RunningSmtpServer {
  port: number;
  stop(): Promise<void>;
}

/** An error the client gets as an SMTP reply (RFC 5321, 4.2.3). */
class SmtpReply extends Error {
  constructor(
    readonly responseCode: number,
    message: string,
  ) {
    super(message);
  }
}

const notAvailable = new SmtpReply(421, 'Service not available, closing transmission channel');

/** Takes every mail on loopback, with any sign-in or none, unless the scenario says otherwise. */
export async function startSmtpServer(port: number, store: MessageStore, control: Control): Promise<RunningSmtpServer> {
  const pauses = new Map<string, AbortController>();
  const server = new SMTPServer({
    name: 'mailbox.example.test',
    banner: 'demo mailbox: nothing leaves this machine',
    size: largestMailBytes,
    disabledCommands: ['STARTTLS'],
    allowInsecureAuth: true,
    authOptional: true,
    disableReverseLookup: true,
    closeTimeout: closeGraceMs,
    logger: false,
    onAuth: (auth, _session, done) => done(null, { user: auth.username ?? 'anybody' }),
    onConnect: (_session, done) => done(control.scenario.mode === 'refuse-connections' ? notAvailable : null),
    // A client that keeps connections open is refused too, else it would not notice the scenario.
    onMailFrom: (_address, _session, done) =>
      done(control.scenario.mode === 'refuse-connections' ? notAvailable : null),
    onRcptTo: ({ address }, _session, done) =>
      done(control.isFor('reject-recipient', [address]) ? new SmtpReply(550, `No such mailbox: ${address}`) : null),
    onData: (stream, session, done) => {
      receive(stream, session, { store, control, pauses }).then(
        (id) => done(null, `OK: kept as ${id}`),
        (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
      );
    },
    onClose: (session) => pauses.get(session.id)?.abort(),
  });
  const address = await listen(server, port);
  return { port: address.port, stop: () => stop(server, pauses) };
}

interface Surroundings {
  store: MessageStore;
  control: Control;
  /** What ends the pause of a slow answer, by session. */
  pauses: Map<string, AbortController>;
}

async function receive(
  stream: SMTPServerDataStream,
  session: SMTPServerSession,
  around: Surroundings,
): Promise<string> {
  const raw = await buffer(stream);
  // The library answers by itself for what is too large; it must only not be kept.
  if (stream.sizeExceeded) throw new SmtpReply(552, 'Message exceeds the largest size');
  const sender = session.envelope.mailFrom ? session.envelope.mailFrom.address : '';
  const recipients = session.envelope.rcptTo.map(({ address }) => address);
  if (around.control.isFor('slow', recipients)) await pause(session, around);
  if (around.control.isFor('temporary-failure', recipients)) {
    throw new SmtpReply(451, 'Requested action aborted: local error in processing');
  }
  const { envelope } = await around.store.add(sender, recipients, raw);
  return envelope.id;
}

/** A client that hangs up during the pause was given no answer, so its mail is not kept. */
async function pause(session: SMTPServerSession, { control, pauses }: Surroundings): Promise<void> {
  const aborter = new AbortController();
  pauses.set(session.id, aborter);
  try {
    await delay(control.scenario.delayMs, undefined, { signal: aborter.signal });
  } catch {
    throw notAvailable;
  } finally {
    pauses.delete(session.id);
  }
}

function listen(server: SMTPServer, port: number): Promise<AddressInfo> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => {
      server.off('error', reject);
      // A client that breaks off mid-sentence is its own trouble and must not end the mailbox.
      server.on('error', () => undefined);
      resolve(server.server.address() as AddressInfo);
    });
  });
}

function stop(server: SMTPServer, pauses: Map<string, AbortController>): Promise<void> {
  for (const aborter of pauses.values()) aborter.abort();
  return new Promise((resolve) => server.close(() => resolve()));
}
