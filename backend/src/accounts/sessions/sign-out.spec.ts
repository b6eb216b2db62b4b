import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cookieHeaderOf, givePassword } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';
import { SessionModel } from '../session.model.js';

const email = 'plumber@example.test';
const password = 'rain on the roof';

describe('signing out', () => {
  let server: TestApp;
  let world: World;
  const signIn = () => world.nobody().post('/api/auth/sign-in', { email, password });
  const bearerOf = (answer: { body: Session }) => ({ Authorization: `Bearer ${answer.body.accessToken}` });
  const isIn = async (answer: { body: Session }) =>
    (await world.nobody().get('/api/me', { headers: bearerOf(answer) })).status === 200;

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    await givePassword(server, world.people.plumber, password);
  });
  afterAll(() => server?.close());

  it('ends this session by its cookie alone, clears the cookie and leaves the other device in', async () => {
    const [phone, desk] = [await signIn(), await signIn()];
    const out = await world.nobody().post('/api/auth/sign-out', {}, { headers: cookieHeaderOf(phone) });
    expect(out.body).toEqual({ done: true });
    expect(out.get('Set-Cookie')?.join()).toMatch(/holdwater_refresh=;/);
    expect([await isIn(phone), await isIn(desk)]).toEqual([false, true]);
    expect((await world.nobody().post('/api/auth/refresh', {}, { headers: cookieHeaderOf(phone) })).body).toMatchObject(
      { code: 'signed-out' },
    );
  });

  it('ends the session of the access token where the cookie is gone', async () => {
    const answer = await signIn();
    await world.nobody().post('/api/auth/sign-out', {}, { headers: bearerOf(answer) });
    expect(await isIn(answer)).toBe(false);
  });

  it('is fine with whoever is not in', async () => {
    expect((await world.nobody().post('/api/auth/sign-out')).body).toEqual({ done: true });
    const odd = await world
      .nobody()
      .post('/api/auth/sign-out', {}, { headers: { Authorization: 'Bearer x', Cookie: 'holdwater_refresh=x' } });
    expect(odd.body).toEqual({ done: true });
  });

  it('everywhere ends every session of this person and of nobody else', async () => {
    const [phone, desk] = [await signIn(), await signIn()];
    const out = await world.nobody().post('/api/auth/sign-out-everywhere', {}, { headers: bearerOf(phone) });
    expect(out.body).toEqual({ done: true });
    expect([await isIn(phone), await isIn(desk)]).toEqual([false, false]);
    expect((await world.as('desk').get('/api/me')).status).toBe(200);
    const reasons = await SessionModel.findAll({
      where: { personId: world.people.plumber.id, endReason: 'signed-out-everywhere' },
    });
    expect(reasons.length).toBeGreaterThanOrEqual(2);
    expect((await world.nobody().post('/api/auth/sign-out-everywhere')).body).toMatchObject({ code: 'signed-out' });
  });
});
