import type { Response } from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { LedgerEntryModel } from '../../ledger/ledger-entry.model.js';
import { accountMailsTo, cookieHeaderOf, givePassword, refreshCookieOf } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { RefreshTokenModel } from '../refresh-token.model.js';
import { SessionModel } from '../session.model.js';

const email = 'plumber@example.test';
const password = 'rain on the roof';
const valueOf = (response: Response) => refreshCookieOf(response)?.value;

describe('refreshing a session', () => {
  let server: TestApp;
  let world: World;
  const signIn = () => world.nobody().post('/api/auth/sign-in', { email, password });
  const refresh = (with_: Response) => world.nobody().post('/api/auth/refresh', {}, { headers: cookieHeaderOf(with_) });

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    await givePassword(server, world.people.plumber, password);
  });
  afterAll(() => server?.close());
  beforeEach(() => server.clock.set(testNow));

  it('gives a new access token and replaces the cookie, whose hash alone is kept', async () => {
    const signedIn = await signIn();
    server.clock.advance(9);
    const refreshed = await refresh(signedIn);
    expect(refreshed.status).toBe(200);
    expect(refreshed.body).toMatchObject({ me: { email }, expiresAt: '2027-03-02T16:49:00.000Z' });
    expect(valueOf(refreshed)).not.toBe(valueOf(signedIn));
    const kept = JSON.stringify(await RefreshTokenModel.findAll());
    expect(kept).not.toContain(valueOf(refreshed));
    expect(kept).not.toContain(valueOf(signedIn));
  });

  it('gives the token just replaced the same successor for a minute', async () => {
    const signedIn = await signIn();
    server.clock.advance(9);
    const first = await refresh(signedIn);
    server.clock.advance(1);
    const second = await refresh(signedIn);
    expect(second.status).toBe(200);
    expect(valueOf(second)).toBe(valueOf(first));
    server.clock.advance(9);
    expect((await refresh(second)).status).toBe(200);
  });

  it('gives the token in force where another tab was quicker by two', async () => {
    const signedIn = await signIn();
    const first = await refresh(signedIn);
    const second = await refresh(first);
    const late = await refresh(signedIn);
    expect(valueOf(late)).toBe(valueOf(second));
  });

  it('lets two tabs that ask at once agree', async () => {
    const signedIn = await signIn();
    const answers = await Promise.all(Array.from({ length: 6 }, () => refresh(signedIn)));
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200, 200, 200, 200]);
    expect(new Set(answers.map(valueOf)).size).toBe(1);
  });

  it('ends the session when an older token comes back, for whoever holds it, and mails the person', async () => {
    const signedIn = await signIn();
    const refreshed = await refresh(signedIn);
    server.clock.advance(1.1);
    const reused = await refresh(signedIn);
    expect(reused.status).toBe(401);
    expect(reused.body).toMatchObject({ code: 'session-reused' });
    expect(reused.get('Set-Cookie')?.join()).toMatch(/holdwater_refresh=;.*Expires=Thu, 01 Jan 1970/);
    // the other holder is out too: the cookie, and the access token at once
    expect((await refresh(refreshed)).body).toMatchObject({ code: 'session-reused' });
    const { accessToken } = refreshed.body as { accessToken: string };
    expect((await world.nobody().get('/api/me', { headers: { Authorization: `Bearer ${accessToken}` } })).status).toBe(
      401,
    );
    expect(await accountMailsTo(email)).toMatchObject([{ mail: 'session-reused', sealedToken: null }]);
    const ended = await SessionModel.findAll({ where: { endReason: 'reused' } });
    expect(ended.map((session) => session.personId)).toEqual([world.people.plumber.id]);
    const entries = await LedgerEntryModel.findAll({ where: { scope: `person:${world.people.plumber.id}` } });
    expect(entries.map((entry) => entry.kind)).toEqual(['session-reused']);
  });

  it('refuses no cookie, an unknown one, and one of a person disabled since', async () => {
    expect((await world.nobody().post('/api/auth/refresh')).body).toMatchObject({ code: 'signed-out' });
    const unknown = await world
      .nobody()
      .post('/api/auth/refresh', {}, { headers: { Cookie: `holdwater_refresh=${'x'.repeat(43)}` } });
    expect(unknown.body).toMatchObject({ code: 'signed-out' });
    const signedIn = await signIn();
    await world.people.plumber.update({ isDisabled: true });
    expect((await refresh(signedIn)).body).toMatchObject({ code: 'signed-out' });
    await world.people.plumber.update({ isDisabled: false });
  });

  it('is over when nobody came for two weeks, and after thirty days whatever was done', async () => {
    const days = (count: number) => count * 24 * 60;
    const idle = await signIn();
    server.clock.advance(days(14) + 1);
    expect((await refresh(idle)).body).toMatchObject({ code: 'signed-out' });
    let busy: Response = await signIn();
    for (const wait of [10, 10, 9.9]) {
      server.clock.advance(days(wait));
      busy = await refresh(busy);
      expect(busy.status).toBe(200);
    }
    server.clock.advance(days(0.1));
    expect((await refresh(busy)).body).toMatchObject({ code: 'signed-out' });
  });
});
