import { randomUUID } from 'node:crypto';
import { startMailbox, type Mailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { givePassword } from '@holdwater/backend/testing/fixtures/accounts.js';
import { createWorld, type World, type WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { startTestApp, type TestApp } from '@holdwater/backend/testing/test-app.js';
import { cloneDatabase } from '@holdwater/backend/testing/test-database.js';
import { serve } from './served.js';

export const password = 'gravel pipe lantern 41';

const secret = `of the browser tests ${randomUUID()}`;

export interface Stack {
  url: string;
  world: World;
  mailbox: Mailbox;
  /** Calls the API as one person, signed in by their password; for what a story only presupposes. @throws unless it answers 2xx */
  call(person: WorldPerson, method: string, path: string, body?: object): Promise<unknown>;
  stop(): Promise<void>;
}

/** Database, mailbox and the built server; organizations, people and lots are rows, their passwords hashed as the accounts do. */
export async function startStack(): Promise<Stack> {
  const database = await cloneDatabase();
  const mailbox = await startMailbox();
  const ends: Array<() => Promise<unknown>> = [() => mailbox.stop(), () => database.drop()];
  const stop = async (): Promise<void> => {
    for (const end of ends) await end();
  };
  try {
    const maker = await startTestApp({ database, now: new Date().toISOString(), environment: { JWT_SECRET: secret } });
    ends.unshift(() => maker.close());
    const world = await createWorld(maker);
    for (const person of Object.values(world.people)) await givePassword(maker, person, password);
    await makeRuleCardsCurrent(maker, world);
    const served = await serve({
      DATABASE_URL: database.appUrl,
      JWT_SECRET: secret,
      SMTP_URL: mailbox.smtpUrl,
    });
    ends.unshift(() => served.stop());
    return { url: served.url, world, mailbox, call: callerOf(served.url, world), stop };
  } catch (error) {
    await stop();
    throw error;
  }
}

/** The fixture's rule cards begin in 2027, its own present; for the system clock's present the same content rules before that. */
async function makeRuleCardsCurrent(maker: TestApp, { ruleCard, otherRuleCard }: World): Promise<void> {
  for (const { departmentId, content } of [ruleCard, otherRuleCard]) {
    await maker.db.query(
      `INSERT INTO rule_cards (id, department_id, version, state, content, effective, created_at, published_at)
       VALUES (:id, :departmentId, 2, 'published', :content, daterange('2020-01-01', '2027-01-01'), now(), now())`,
      { replacements: { id: randomUUID(), departmentId, content: JSON.stringify(content) } },
    );
  }
}

function callerOf(url: string, world: World): Stack['call'] {
  const tokens = new Map<WorldPerson, Promise<string>>();
  const send = async (
    method: string,
    path: string,
    body: object | undefined,
    token: string | null,
  ): Promise<unknown> => {
    const answer = await fetch(`${url}${path}`, {
      method,
      headers: {
        'Content-Type': 'application/json',
        'Idempotency-Key': randomUUID(),
        ...(token === null ? {} : { Authorization: `Bearer ${token}` }),
      },
      body: body === undefined ? undefined : JSON.stringify(body),
    });
    const text = await answer.text();
    if (!answer.ok) throw new Error(`${method} ${path} answered ${answer.status}: ${text}`);
    return text === '' ? null : JSON.parse(text);
  };
  const signIn = async (person: WorldPerson): Promise<string> => {
    const body = { email: world.people[person].email, password };
    const session = (await send('POST', '/api/auth/sign-in', body, null)) as { accessToken: string };
    return session.accessToken;
  };
  return async (person, method, path, body) => {
    const token = tokens.get(person) ?? signIn(person);
    tokens.set(person, token);
    return send(method, path, body, await token);
  };
}
