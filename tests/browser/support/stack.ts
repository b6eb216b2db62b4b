import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Passwords } from '@holdwater/backend/accounts/passwords/passwords.js';
import type { World, WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { startMailbox, type Mailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { connectAsOwner } from '../../support/owner-connection.js';
import { seedDatabase, type SeededDatabase } from '../../support/seeded-database.js';
import { startServer } from '../../support/server-process.js';

export const password = 'gravel pipe lantern 41';

/** Where the built page lies; another place when a run says so. */
const staticDir = process.env.TEST_STATIC_DIR ?? fileURLToPath(new URL('../../../frontend/dist', import.meta.url));

export interface Stack {
  url: string;
  world: World;
  mailbox: Mailbox;
  /** Calls the API as one person, for what a story only presupposes. @throws unless it answers 2xx */
  call(person: WorldPerson, method: 'get' | 'post' | 'patch', path: string, body?: object): Promise<unknown>;
  stop(): Promise<void>;
}

/** Database, mailbox and the built server with its page; organizations, people and lots are rows, passwords hashed as the accounts do. */
export async function startStack(): Promise<Stack> {
  if (!existsSync(`${staticDir}/index.html`))
    throw new Error(`no page in ${staticDir}: build it first, as npm test does`);
  const ends: Array<() => Promise<unknown>> = [];
  const stop = async (): Promise<void> => {
    for (const end of ends) await end();
  };
  try {
    const seeded = await seedDatabase();
    ends.unshift(() => seeded.database.drop());
    await givePasswords(seeded);
    const mailbox = await startMailbox();
    ends.unshift(() => mailbox.stop());
    const server = await startServer({ ...seeded.environment(mailbox.smtpUrl), ROLE: 'all', STATIC_DIR: staticDir });
    ends.unshift(() => server.stop());
    return { url: server.url, world: seeded.world, mailbox, call: callerOf(seeded, server.url), stop };
  } catch (error) {
    await stop();
    throw error;
  }
}

/** One hash for all: hashing is slow by purpose. */
async function givePasswords({ database }: SeededDatabase): Promise<void> {
  const hash = await new Passwords().hash(password);
  const owner = await connectAsOwner(database);
  try {
    await owner.rows('UPDATE persons SET password_hash = $1', [hash]);
  } finally {
    await owner.close();
  }
}

function callerOf(seeded: SeededDatabase, url: string): Stack['call'] {
  return async (person, method, path, body) => {
    const caller = seeded.as(person, url);
    const answer = await (method === 'get' ? caller.get(path) : caller[method](path, body ?? {}));
    if (answer.status >= 300)
      throw new Error(`${person} ${method} ${path}: ${answer.status} ${JSON.stringify(answer.body)}`);
    return answer.body as unknown;
  };
}
