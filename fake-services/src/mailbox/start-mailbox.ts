import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Control } from './control.js';
import type { Scenario } from './control.js';
import { startHttpServer } from './http-server.js';
import { toMailView } from './mail-types.js';
import type { MailView } from './mail-types.js';
import type { MailFilter } from './message-filter.js';
import { MessageStore } from './message-store.js';
import { startSmtpServer } from './smtp-server.js';

export interface MailboxOptions {
  /** 0 or none: any free port. */
  smtpPort?: number;
  /** 0 or none: any free port. */
  httpPort?: number;
  /** Where the mails are kept; none: a folder for this run only, deleted by `stop`. */
  directory?: string;
}

export interface Mailbox {
  smtpUrl: string;
  httpUrl: string;
  /** Mails that pass the filter, newest first. @throws FilterError */
  messages(filter?: MailFilter): MailView[];
  /** Resolves with the newest mail that passes, as soon as there is one. @throws after `timeoutMs` without */
  waitForMessage(filter?: MailFilter, timeoutMs?: number): Promise<MailView>;
  /** Deletes every mail and tells how many there were. */
  clear(): Promise<number>;
  /** @throws ScenarioError */
  setScenario(scenario: Partial<Scenario>): void;
  /** Ends both servers; a mail that is half sent is not kept. */
  stop(): Promise<void>;
}

/** Starts the mailbox in this process. @throws when a port is in use or the folder cannot be written */
export async function startMailbox(options: MailboxOptions = {}): Promise<Mailbox> {
  const directory = options.directory ?? (await mkdtemp(join(tmpdir(), 'holdwater-mailbox-')));
  const store = await MessageStore.open(directory);
  const control = new Control();
  const smtp = await startSmtpServer(options.smtpPort ?? 0, store, control);
  const smtpUrl = `smtp://127.0.0.1:${smtp.port}`;
  const http = await startHttpServer(options.httpPort ?? 0, { store, control, smtpUrl }).catch(
    async (error: unknown) => {
      await smtp.stop();
      throw error;
    },
  );
  const httpUrl = `http://127.0.0.1:${http.port}`;
  const messages = (filter?: MailFilter) => store.list(filter).map((mail) => toMailView(mail, httpUrl));
  return {
    smtpUrl,
    httpUrl,
    messages,
    waitForMessage: async (filter, timeoutMs = 10_000) => toMailView(await store.waitFor(filter, timeoutMs), httpUrl),
    clear: () => store.clear(),
    setScenario: (scenario) => void control.set(scenario),
    stop: async () => {
      await Promise.all([smtp.stop(), http.stop()]);
      await store.settle();
      if (options.directory === undefined) await rm(directory, { recursive: true, force: true });
    },
  };
}
