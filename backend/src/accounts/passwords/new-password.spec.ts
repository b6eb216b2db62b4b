import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { LedgerEntryModel } from '../../ledger/ledger-entry.model.js';
import { accountMailsTo, givePassword, mailedTokenOf, refreshCookieOf } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { SessionModel } from '../session.model.js';

const email = 'plumber@example.test';
const password = 'rain on the roof';
const another = 'water in the stack';

describe('another password', () => {
  let server: TestApp;
  let world: World;
  const signIn = (with_: string) => world.nobody().post('/api/auth/sign-in', { email, password: with_ });
  const ask = (address: string) => world.nobody().post('/api/auth/password-reset', { email: address });
  const reset = (token: string, to: string) =>
    world.nobody().post('/api/auth/password-reset/use', { token, password: to });
  const change = (currentPassword: string, to: string, headers: object = {}) =>
    world.as('plumber').post('/api/me/password', { currentPassword, password: to }, { headers: { ...headers } });
  const openSessions = () => SessionModel.count({ where: { personId: world.people.plumber.id, endedAt: null } });

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());
  beforeEach(async () => {
    server.clock.set(testNow);
    await givePassword(server, world.people.plumber, password);
    await server.db.query('DELETE FROM sign_in_failures');
    await server.db.query('DELETE FROM link_tokens');
    await SessionModel.update({ endedAt: null, endReason: null }, { where: { id: world.sessions.plumber } });
  });

  describe('by a mailed link', () => {
    it('is mailed to whoever has the address; nobody is told whether one has', async () => {
      const [known, unknown] = [await ask(email), await ask('nobody@example.test')];
      expect([known.status, unknown.status]).toEqual([202, 202]);
      expect(known.body).toEqual(unknown.body);
      expect((await accountMailsTo(email)).at(-1)).toMatchObject({ mail: 'password-reset' });
      expect(await accountMailsTo('nobody@example.test')).toEqual([]);
    });

    it('is set once, signs in, ends every other session and tells by mail', async () => {
      await signIn(password);
      await ask(email);
      const token = await mailedTokenOf(server, email);
      const answer = await reset(token, another);
      expect(answer.body).toMatchObject({ me: { email } });
      expect(refreshCookieOf(answer)).not.toBeNull();
      expect(await openSessions()).toBe(1);
      expect((await signIn(password)).status).toBe(401);
      expect((await signIn(another)).status).toBe(200);
      expect((await reset(token, password)).body).toMatchObject({ code: 'link-expired' });
      expect((await accountMailsTo(email)).at(-1)).toMatchObject({ mail: 'password-changed', sealedToken: null });
      const entries = await LedgerEntryModel.findAll({ where: { scope: `person:${world.people.plumber.id}` } });
      expect(entries.at(-1)).toMatchObject({ kind: 'password-changed', actorId: world.people.plumber.id });
    });

    it('leaves the link good when the password is refused', async () => {
      await ask(email);
      const token = await mailedTokenOf(server, email);
      expect((await reset(token, 'password')).body).toMatchObject({ code: 'password-common' });
      expect((await reset(token, 'short')).body).toMatchObject({
        code: 'bad-input',
        fields: { password: 'password-short' },
      });
      expect((await reset(token, another)).status).toBe(200);
    });

    it('is refused after ten minutes, and once the password was changed by another link', async () => {
      await ask(email);
      const first = await mailedTokenOf(server, email);
      await ask(email);
      const second = await mailedTokenOf(server, email);
      expect((await reset(second, another)).status).toBe(200);
      expect((await reset(first, password)).body).toMatchObject({ code: 'link-expired' });
      await ask(email);
      server.clock.advance(10);
      expect((await reset(await mailedTokenOf(server, email), password)).body).toMatchObject({ code: 'link-expired' });
    });
  });

  describe('by the one in force', () => {
    it('keeps this session and ends the others', async () => {
      const other = (await signIn(password)).body as Session;
      expect((await change(password, another)).body).toEqual({ done: true });
      expect((await world.as('plumber').get('/api/me')).status).toBe(200);
      const otherIsIn = await world
        .nobody()
        .get('/api/me', { headers: { Authorization: `Bearer ${other.accessToken}` } });
      expect(otherIsIn.status).toBe(401);
      expect((await signIn(another)).status).toBe(200);
      expect((await accountMailsTo(email)).at(-1)).toMatchObject({ mail: 'password-changed' });
    });

    it('voids a link mailed before', async () => {
      await ask(email);
      const token = await mailedTokenOf(server, email);
      await change(password, another);
      expect((await reset(token, password)).body).toMatchObject({ code: 'link-expired' });
    });

    it('refuses a wrong one as a fault of the form, and throttles guessing', async () => {
      const wrong = await change('wrong', another);
      expect(wrong.body).toMatchObject({
        code: 'bad-input',
        fields: { currentPassword: 'wrong' },
        params: { triesLeft: 4 },
      });
      for (let n = 0; n < 4; n += 1) await change('wrong', another);
      expect((await change(password, another)).body).toMatchObject({ code: 'sign-in-throttled' });
    });

    it('refuses a common or short one, and nobody signed out', async () => {
      expect((await change(password, 'password123')).body).toMatchObject({ code: 'password-common' });
      expect((await change(password, 'short')).body).toMatchObject({
        code: 'bad-input',
        fields: { password: 'password-short' },
      });
      const out = await world.nobody().post('/api/me/password', { currentPassword: password, password: another });
      expect(out.body).toMatchObject({ code: 'signed-out' });
    });

    it('leaves no quick hash of a password among the stored answers', async () => {
      await change(password, another);
      const rows = await server.db.query(`SELECT 1 FROM idempotent_answers WHERE route LIKE '%/api/me/password'`, {
        type: QueryTypes.SELECT,
      });
      expect(rows).toEqual([]);
    });
  });
});
