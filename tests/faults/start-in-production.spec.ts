import { callerOf } from '@holdwater/backend/testing/fixtures/caller.js';
import { cloneDatabase, type TestDatabase } from '@holdwater/backend/testing/test-database.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { environmentOf } from '../support/seeded-database.js';
import { patienceMs, spawnServer } from '../support/server-process.js';
import { useServers } from '../support/use-servers.js';

const noMail = 'smtp://127.0.0.1:9';
const missingIn = (output: string) => [...output.matchAll(/(\w+) is missing/g)].map(([, name]) => name).sort();
const needed = ['PORT', 'APP_URL', 'DATABASE_URL', 'JWT_SECRET', 'SMTP_URL', 'MAIL_FROM'];

describe('a server without its environment', () => {
  it('does not start, and names every variable that is missing', { timeout: patienceMs }, async () => {
    const server = spawnServer({ NODE_ENV: 'production' });
    expect(await server.ended).toBe(1);
    expect(missingIn(server.output())).toEqual([...needed].sort());
  });

  it('names one alone when only that is missing', { timeout: patienceMs }, async () => {
    const given = {
      PORT: '0',
      APP_URL: 'http://127.0.0.1:4310',
      ...environmentOf(unreachable, noMail),
      JWT_SECRET: '',
    };
    const server = spawnServer({ ...given, HOLDWATER_MODE: 'production' });
    expect(await server.ended).toBe(1);
    expect(missingIn(server.output())).toEqual(['JWT_SECRET']);
  });
});

/** Never asked: the environment is refused before. Port 9 (discard, RFC 863). */
const unreachable: TestDatabase = {
  appUrl: 'postgres://nobody@127.0.0.1:9/none',
  ownerUrl: 'postgres://nobody@127.0.0.1:9/none',
  drop: () => Promise.resolve(),
};

describe('a server in production on an empty, migrated database', () => {
  let database: TestDatabase;

  afterAll(() => database?.drop());
  const servers = useServers();
  beforeAll(async () => {
    database = await cloneDatabase();
  });

  it('prints a link for the first operator, which works once', async () => {
    const environment = { ...environmentOf(database, noMail), HOLDWATER_MODE: 'production' };
    const server = await servers.start(environment);
    const linkOf = (output: string) => /http:\S+\/link\/invitation#token=(\S+)/.exec(output);
    const [link = '', token = ''] = linkOf(server.output()) ?? [];
    expect(link.startsWith(`${server.url}/link/invitation#token=`)).toBe(true);

    const accept = (email: string) =>
      callerOf(server.url, null).post('/api/auth/invitation/accept', {
        token,
        name: 'Quill Ambrose',
        email,
        password: 'rain on the roof',
      });
    const accepted = await accept('quill@example.test');
    expect(accepted.body).toMatchObject({ me: { email: 'quill@example.test', isOperator: true } });
    const again = await accept('second@example.test');
    expect({ status: again.status, code: again.body.code }).toEqual({ status: 410, code: 'link-expired' });

    const { accessToken } = accepted.body as { accessToken: string };
    const ledger = await callerOf(server.url, accessToken).get('/api/operations/ledger');
    expect(ledger.body).toMatchObject({ broken: [] });
    await server.stop();
    const next = await servers.start(environment);
    expect(linkOf(next.output())).toBeNull();
  });
});
