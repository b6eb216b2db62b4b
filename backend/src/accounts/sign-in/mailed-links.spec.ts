import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { accountMailsTo, mailedTokenOf, refreshCookieOf } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { LinkTokenModel } from '../link-token.model.js';

const email = 'plumber@example.test';

describe('signing in by a mailed link', () => {
  let server: TestApp;
  let world: World;
  const ask = (address: string) => world.nobody().post('/api/auth/sign-in-link', { email: address });
  const use = (token: string) => world.nobody().post('/api/auth/sign-in-link/use', { token });

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());
  beforeEach(async () => {
    server.clock.set(testNow);
    await server.db.query('DELETE FROM link_tokens');
  });

  it('answers the same whether or not anybody has the address, and mails whoever has it', async () => {
    const [known, unknown] = [await ask(email), await ask('nobody@example.test')];
    expect([known.status, unknown.status]).toEqual([202, 202]);
    expect(known.body).toEqual(unknown.body);
    expect(Object.keys(known.headers).sort()).toEqual(Object.keys(unknown.headers).sort());
    expect(await accountMailsTo(email)).toMatchObject([
      { mail: 'sign-in-link', name: 'Ruben Achterberg', locale: 'en' },
    ]);
    expect(await accountMailsTo('nobody@example.test')).toEqual([]);
  });

  it('keeps the secret neither in the outbox nor in its own table', async () => {
    await ask(email);
    const token = await mailedTokenOf(server, email);
    const rows = JSON.stringify([await accountMailsTo(email), await LinkTokenModel.findAll()]);
    expect(rows).not.toContain(token);
  });

  it('signs in once', async () => {
    await ask(email);
    const token = await mailedTokenOf(server, email);
    const first = await use(token);
    expect(first.body).toMatchObject({ me: { email } });
    expect(refreshCookieOf(first)).not.toBeNull();
    const second = await use(token);
    expect(second.status).toBe(410);
    expect(second.body).toMatchObject({ code: 'link-expired' });
  });

  it('signs in once when used twice at once', async () => {
    await ask(email);
    const token = await mailedTokenOf(server, email);
    const statuses = (await Promise.all([use(token), use(token), use(token)])).map((answer) => answer.status);
    expect(statuses.sort()).toEqual([200, 410, 410]);
  });

  // ten minutes: OWASP ASVS 5.0 6.6.2 wants out-of-band codes short-lived, ten minutes at most
  it('is good for ten minutes', async () => {
    await ask(email);
    const token = await mailedTokenOf(server, email);
    server.clock.advance(10);
    expect((await use(token)).body).toMatchObject({ code: 'link-expired' });
    server.clock.advance(-1);
    expect((await use(token)).status).toBe(200);
  });

  it('opens nothing else, and nothing unknown opens it', async () => {
    await ask(email);
    const token = await mailedTokenOf(server, email);
    const reset = await world.nobody().post('/api/auth/password-reset/use', { token, password: 'rain on the roof' });
    expect(reset.body).toMatchObject({ code: 'link-expired' });
    expect((await world.nobody().post('/api/auth/invitation', { token })).body).toMatchObject({ code: 'link-expired' });
    expect((await use('x'.repeat(43))).body).toMatchObject({ code: 'link-expired' });
    expect((await use('short')).body).toMatchObject({ code: 'bad-input' });
    expect((await use(token)).status).toBe(200);
  });

  it('is not mailed a fourth time while three are open, nor to a disabled person', async () => {
    const before = (await accountMailsTo(email)).length;
    for (let n = 0; n < 5; n += 1) expect((await ask(email)).status).toBe(202);
    expect((await accountMailsTo(email)).length - before).toBe(3);
    server.clock.advance(11);
    await ask(email);
    expect((await accountMailsTo(email)).length - before).toBe(4);
    await world.people.helper.update({ isDisabled: true });
    expect((await ask('helper@example.test')).status).toBe(202);
    expect(await accountMailsTo('helper@example.test')).toEqual([]);
  });

  it('is refused when the person was disabled after it was mailed', async () => {
    await ask('desk@example.test');
    const token = await mailedTokenOf(server, 'desk@example.test');
    await world.people.desk.update({ isDisabled: true });
    expect((await use(token)).body).toMatchObject({ code: 'link-expired' });
  });
});
