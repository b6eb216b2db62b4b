import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { LedgerEntryModel } from '../ledger/ledger-entry.model.js';
import { callerOf } from '../testing/fixtures/caller.js';
import { cloneDatabase, type TestDatabase } from '../testing/test-database.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';

const password = 'rain on the roof';

describe('the first operator of an installation', () => {
  let database: TestDatabase;
  let server: TestApp | null = null;

  beforeAll(async () => {
    database = await cloneDatabase();
  });
  afterEach(stop);
  afterAll(() => database?.drop());

  async function stop(): Promise<void> {
    await server?.close();
    server = null;
  }

  /** Starts a server, the one before stopped; the secret of the link it printed, or null. */
  async function start(
    environment: Record<string, string> = {},
    on = database,
  ): Promise<{ token: string | null; server: TestApp }> {
    await stop();
    const printed = vi.spyOn(console, 'log').mockImplementation(() => undefined);
    server = await startTestApp({ database: on, environment: { HOLDWATER_MODE: 'production', ...environment } });
    const words = printed.mock.calls.flat().join('\n');
    printed.mockRestore();
    const token = /http:\/\/127\.0\.0\.1:4310\/link\/invitation#token=(\S+)/.exec(words)?.[1] ?? null;
    return { token, server };
  }
  const nobody = (at: TestApp) => callerOf(at.url, null);

  it('is invited by nobody in the demo, nor by a worker', async () => {
    expect((await start({ HOLDWATER_MODE: 'demo' })).token).toBeNull();
    expect((await start({ ROLE: 'worker' })).token).toBeNull();
  });

  it('is whoever opens the newest printed link, once, within a day; then no more are printed', async () => {
    const first = await start();
    const second = await start();
    expect(first.token).not.toBeNull();
    expect(second.token).not.toBe(first.token);
    const caller = nobody(second.server);
    expect((await caller.post('/api/auth/invitation', { token: first.token })).body).toMatchObject({
      code: 'link-expired',
    });
    const shown = await caller.post('/api/auth/invitation', { token: second.token });
    expect(shown.body).toEqual({ email: '', name: '', organization: null, roles: [], hasPassword: false });

    const accept = (more: object) =>
      caller.post('/api/auth/invitation/accept', { token: second.token, name: 'Quill Ambrose', password, ...more });
    expect((await accept({})).body).toMatchObject({ code: 'bad-input', fields: { email: 'required' } });
    const accepted = await accept({ email: 'quill@example.test' });
    expect(accepted.body).toMatchObject({ me: { email: 'quill@example.test', isOperator: true, memberships: [] } });
    expect((await accept({ email: 'quill@example.test' })).body).toMatchObject({ code: 'link-expired' });
    const entries = await LedgerEntryModel.findAll({ where: { scope: 'installation' } });
    expect(entries.map((entry) => entry.kind)).toEqual(['operator-joined']);

    const { accessToken } = accepted.body as { accessToken: string };
    const added = await callerOf(second.server.url, accessToken).post('/api/organizations', {
      name: 'Thornwick',
      kind: 'builder',
      ownerEmail: 'ida@example.test',
      ownerName: 'Ida Thornwick',
    });
    expect(added.status).toBe(201);

    expect((await start()).token).toBeNull();
  });

  it('has a day to do so', async () => {
    const fresh = await cloneDatabase();
    try {
      const { token, server: at } = await start({}, fresh);
      at.clock.advance(24 * 60 - 1);
      expect((await nobody(at).post('/api/auth/invitation', { token })).status).toBe(200);
      at.clock.advance(1);
      expect((await nobody(at).post('/api/auth/invitation', { token })).body).toMatchObject({ code: 'link-expired' });
    } finally {
      await stop();
      await fresh.drop();
    }
  });
});
