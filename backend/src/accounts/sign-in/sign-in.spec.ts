import { session } from '@holdwater/shared-types/accounts/auth.contract.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { cookieHeaderOf, givePassword, refreshCookieOf } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { SessionModel } from '../session.model.js';

const email = 'plumber@example.test';
const password = 'rain on the roof';

describe('signing in by password', () => {
  let server: TestApp;
  let world: World;
  const signIn = (body: object, from = '192.0.2.1') =>
    world.nobody().post('/api/auth/sign-in', body, { headers: { 'X-Forwarded-For': from } });

  beforeAll(async () => {
    server = await startTestApp({ environment: { TRUSTED_PROXIES: '1' } });
    world = await createWorld(server);
    await givePassword(server, world.people.plumber, password);
  });
  afterAll(() => server?.close());
  beforeEach(async () => {
    server.clock.set(testNow);
    await server.db.query('DELETE FROM sign_in_failures');
  });

  it('gives a token that works, who one is, and a cookie no script and no other site gets at', async () => {
    const answer = await signIn({ email: 'Plumber@Example.test', password });
    expect(answer.status).toBe(200);
    const { accessToken, expiresAt, me } = session.parse(answer.body);
    expect(me).toMatchObject({
      name: 'Ruben Achterberg',
      email,
      memberships: [{ organization: { name: 'Dunlatch Plumbing' }, roles: ['plumber'] }],
    });
    // ten minutes from the test's present
    expect(expiresAt).toBe('2027-03-02T16:40:00.000Z');
    // OWASP ASVS 5.0 3.3.1–3.3.4: HttpOnly, SameSite, name; Secure on https, below
    expect(refreshCookieOf(answer)).toMatchObject({
      name: 'holdwater_refresh',
      httpOnly: true,
      sameSite: 'strict',
      path: '/',
    });
    expect(JSON.stringify(answer.body)).not.toContain(refreshCookieOf(answer)?.value);
    const mine = await world.nobody().get('/api/me', { headers: { Authorization: `Bearer ${accessToken}` } });
    expect(mine.body).toMatchObject({ email });
  });

  it('tells the tries left, and the same for an address nobody has', async () => {
    const known = [];
    const unknown = [];
    for (let n = 0; n < 6; n += 1) {
      known.push((await signIn({ email, password: 'wrong' })).body as object);
      unknown.push((await signIn({ email: 'nobody@example.test', password: 'wrong' })).body as object);
    }
    expect(known.map(withoutEntry)).toEqual(unknown.map(withoutEntry));
    expect(known).toMatchObject([
      ...[4, 3, 2, 1, 0].map((triesLeft) => ({ code: 'sign-in-failed', params: { triesLeft } })),
      { code: 'sign-in-throttled', params: { retryAfterSeconds: 900 } },
    ]);
  });

  it('says when the next try is, and lets even the right password wait until then', async () => {
    await signIn({ email, password: 'wrong' });
    server.clock.advance(5);
    for (let n = 0; n < 4; n += 1) await signIn({ email, password: 'wrong' });
    const refused = await signIn({ email, password });
    expect(refused.status).toBe(429);
    expect(refused.get('Retry-After')).toBe('600');
    server.clock.advance(10);
    expect((await signIn({ email, password })).status).toBe(200);
  });

  it('counts failures only: a success forgives them', async () => {
    for (let n = 0; n < 4; n += 1) await signIn({ email, password: 'wrong' });
    for (let n = 0; n < 8; n += 1) expect((await signIn({ email, password })).status).toBe(200);
    expect((await signIn({ email, password: 'wrong' })).body).toMatchObject({ params: { triesLeft: 4 } });
  });

  it('counts per account and address together: a stranger elsewhere locks nobody out', async () => {
    for (let n = 0; n < 6; n += 1) await signIn({ email, password: 'wrong' }, '198.51.100.9');
    expect((await signIn({ email, password }, '198.51.100.9')).status).toBe(429);
    expect((await signIn({ email, password }, '192.0.2.1')).status).toBe(200);
    expect((await signIn({ email: 'desk@example.test', password: 'x' }, '198.51.100.9')).body).toMatchObject({
      code: 'sign-in-failed',
    });
  });

  it('lets no more through when many come at once', async () => {
    const answers = await Promise.all(Array.from({ length: 12 }, () => signIn({ email, password: 'wrong' })));
    const codes = answers.map((answer) => (answer.body as { code: string }).code);
    expect(codes.filter((code) => code === 'sign-in-failed')).toHaveLength(5);
    expect(codes.filter((code) => code === 'sign-in-throttled')).toHaveLength(7);
  });

  it('refuses a person without a password, and a disabled one, as it refuses a wrong password', async () => {
    expect((await signIn({ email: 'desk@example.test', password })).body).toMatchObject({ code: 'sign-in-failed' });
    await givePassword(server, world.people.helper, password);
    await world.people.helper.update({ isDisabled: true });
    expect((await signIn({ email: 'helper@example.test', password })).body).toMatchObject({
      code: 'sign-in-failed',
      params: { triesLeft: 4 },
    });
  });

  it('ends the session this browser had', async () => {
    const first = await signIn({ email, password });
    const before = await SessionModel.count({ where: { personId: world.people.plumber.id, endedAt: null } });
    await world.nobody().post('/api/auth/sign-in', { email, password }, { headers: cookieHeaderOf(first) });
    expect(await SessionModel.count({ where: { personId: world.people.plumber.id, endedAt: null } })).toBe(before);
  });

  it('names what is wrong with the input', async () => {
    const answer = await signIn({ email: 'no address', password: '', more: 1 });
    expect(answer.body).toMatchObject({ code: 'bad-input', fields: { password: 'required', more: 'unknown' } });
    expect((answer.body as { fields: object }).fields).toHaveProperty('email');
  });

  it('binds the cookie to the host over https', async () => {
    const https = await startTestApp({
      database: server.database,
      environment: { APP_URL: 'https://holdwater.example.test' },
    });
    try {
      const overHttps = await fetch(`${https.url}/api/auth/sign-in`, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json' },
        body: JSON.stringify({ email, password }),
      });
      const line = overHttps.headers.get('set-cookie') ?? '';
      // RFC 6265bis 4.1.3.2: __Host- needs Secure, Path=/ and no Domain
      expect(line).toMatch(/^__Host-holdwater_refresh=/);
      expect(line).toContain('; Secure');
      expect(line).toContain('; Path=/');
      expect(line).not.toContain('Domain');
    } finally {
      await https.close();
    }
  });
});

function withoutEntry(body: object): object {
  return { ...body, entry: undefined };
}
