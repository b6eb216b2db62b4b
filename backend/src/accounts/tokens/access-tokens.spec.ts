import { createHmac, randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { Authentication } from '../sessions/authentication.service.js';
import { SessionModel } from '../session.model.js';

const encode = (part: object) => Buffer.from(JSON.stringify(part)).toString('base64url');

/** A token written by hand after RFC 7515 and 7519, not by the library that reads it. */
function forge(claims: object, secret: string, alg = 'HS256'): string {
  const signed = `${encode({ alg, typ: 'JWT' })}.${encode(claims)}`;
  if (alg === 'none') return `${signed}.`;
  return `${signed}.${createHmac(alg.replace('HS', 'sha'), secret).update(signed).digest('base64url')}`;
}

// OWASP ASVS 5.0 9.1.1–9.2.3: signature, allowed algorithm, time, type and audience are checked
describe('the access token of a request', () => {
  let server: TestApp;
  let world: World;
  let good: { sub: string; sid: string; iat: number; exp: number; iss: string; aud: string };
  const statusOf = async (token: string) =>
    (await world.nobody().get('/api/me', { headers: { Authorization: `Bearer ${token}` } })).status;
  const both = async (token: string) =>
    [await statusOf(token), await server.get(Authentication).findActorOfToken(token)] as const;

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    const iat = Date.parse(testNow) / 1000;
    good = {
      sub: world.people.plumber.id,
      sid: world.sessions.plumber,
      iat,
      exp: iat + 600,
      iss: 'holdwater',
      aud: 'holdwater-api',
    };
  });
  afterAll(() => server?.close());
  beforeEach(() => server.clock.set(testNow));

  it('is taken when all of it is right', async () => {
    const [status, actor] = await both(forge(good, server.environment.JWT_SECRET));
    expect(status).toBe(200);
    expect(actor).toMatchObject({ personId: world.people.plumber.id });
  });

  it.each([
    ['without a signature', (claims: object) => forge(claims, '', 'none')],
    [
      'by another algorithm of the same secret',
      (claims: object) => forge(claims, server.environment.JWT_SECRET, 'HS512'),
    ],
    ['under another secret', (claims: object) => forge(claims, 'another secret, as long as the one it is not')],
    ['of another issuer', (claims: object) => forge({ ...claims, iss: 'elsewhere' }, server.environment.JWT_SECRET)],
    ['for another audience', (claims: object) => forge({ ...claims, aud: 'mail' }, server.environment.JWT_SECRET)],
    ['without an audience', (claims: object) => forge({ ...claims, aud: undefined }, server.environment.JWT_SECRET)],
    ['without an end', (claims: object) => forge({ ...claims, exp: undefined }, server.environment.JWT_SECRET)],
    ['of no session', (claims: object) => forge({ ...claims, sid: undefined }, server.environment.JWT_SECRET)],
    [
      'of an unknown session',
      (claims: object) => forge({ ...claims, sid: randomUUID() }, server.environment.JWT_SECRET),
    ],
    [
      'of the session of another',
      (claims: object) => forge({ ...claims, sid: world.sessions.desk }, server.environment.JWT_SECRET),
    ],
    [
      'with a changed payload',
      (claims: object) => {
        const [head, , signature] = forge(claims, server.environment.JWT_SECRET).split('.');
        return [head, encode({ ...claims, sub: world.people.desk.id }), signature].join('.');
      },
    ],
    ['that is none', () => 'not.a.token'],
  ])('is refused %s', async (_how, make) => {
    expect(await both(make(good))).toEqual([401, null]);
  });

  it('is over after ten minutes of the server clock', async () => {
    const token = world.tokenOf('plumber');
    server.clock.advance(9.9);
    expect(await statusOf(token)).toBe(200);
    server.clock.advance(0.1);
    expect(await both(token)).toEqual([401, null]);
  });

  // 7.4.2: a disabled person is out at once; 7.4.1: so is an ended session
  it('is worth nothing once its session ended or ran out, or its person is disabled', async () => {
    const session = await SessionModel.findByPk(world.sessions.inspector, { rejectOnEmpty: true });
    await session.update({ endedAt: server.clock.now(), endReason: 'signed-out' });
    expect(await both(world.tokenOf('inspector'))).toEqual([401, null]);
    await session.update({ endedAt: null, endReason: null, expiresAt: server.clock.now() });
    expect(await both(world.tokenOf('inspector'))).toEqual([401, null]);
    const token = world.tokenOf('helper');
    expect(await statusOf(token)).toBe(200);
    await world.people.helper.update({ isDisabled: true });
    expect(await both(token)).toEqual([401, null]);
  });

  it('is refused in words one knows: signed out', async () => {
    expect((await world.nobody().get('/api/me')).body).toMatchObject({ code: 'signed-out' });
  });
});
