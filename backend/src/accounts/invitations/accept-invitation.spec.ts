import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { LedgerEntryModel } from '../../ledger/ledger-entry.model.js';
import { givePassword, mailedTokenOf, refreshCookieOf } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { PersonModel } from '../person.model.js';

const password = 'rain on the roof';

describe('accepting an invitation', () => {
  let server: TestApp;
  let world: World;
  let guests = 0;

  /** Invites somebody to Dunlatch Plumbing; the secret of the mailed link. */
  async function invited(email: string, roles: MemberRole[] = ['helper']): Promise<string> {
    const path = `/api/organizations/${world.organizations.plumber.id}/invitations`;
    const answer = await world.as('plumberOwner').post(path, { email, name: 'Ida Thornwick', roles });
    expect(answer.status).toBe(201);
    return mailedTokenOf(server, email);
  }
  const newGuest = () => `guest${(guests += 1)}@example.test`;
  const read = (token: string) => world.nobody().post('/api/auth/invitation', { token });
  const accept = (body: object) => world.nobody().post('/api/auth/invitation/accept', body);

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    await givePassword(server, world.people.inspector, password);
  });
  afterAll(() => server?.close());
  beforeEach(async () => {
    server.clock.set(testNow);
    await server.db.query('DELETE FROM sign_in_failures');
  });

  it('shows what it invites to', async () => {
    const email = newGuest();
    expect((await read(await invited(email))).body).toEqual({
      email,
      name: 'Ida Thornwick',
      organization: {
        id: world.organizations.plumber.id,
        name: 'Dunlatch Plumbing',
        kind: 'plumber',
        phone: '555-0101',
      },
      roles: ['helper'],
      hasPassword: false,
    });
  });

  it('lets a new person in with a name and a password of their own', async () => {
    const email = newGuest();
    const token = await invited(email);
    const answer = await accept({ token, name: 'Ida T.', password, locale: 'es' });
    expect(answer.body).toMatchObject({
      me: {
        name: 'Ida T.',
        email,
        locale: 'es',
        memberships: [{ organization: { name: 'Dunlatch Plumbing' }, roles: ['helper'] }],
      },
    });
    expect(refreshCookieOf(answer)).not.toBeNull();
    expect((await world.nobody().post('/api/auth/sign-in', { email, password })).status).toBe(200);
    const entries = await LedgerEntryModel.findAll({ where: { kind: 'person-joined' } });
    const person = await PersonModel.findOne({ where: { email }, rejectOnEmpty: true });
    expect(entries.at(-1)).toMatchObject({ actorId: person.id, payload: { personId: person.id, roles: ['helper'] } });
    expect((await accept({ token, password })).body).toMatchObject({ code: 'link-expired' });
    expect((await read(token)).body).toMatchObject({ code: 'link-expired' });
  });

  it('keeps the name of the invitation where none is given, and refuses a poor password without using the link up', async () => {
    const email = newGuest();
    const token = await invited(email);
    expect((await accept({ token })).body).toMatchObject({ code: 'bad-input', fields: { password: 'required' } });
    expect((await accept({ token, password: 'short' })).body).toMatchObject({ fields: { password: 'password-short' } });
    expect((await accept({ token, password: 'password1' })).body).toMatchObject({ code: 'password-common' });
    expect(await PersonModel.count({ where: { email } })).toBe(0);
    expect((await accept({ token, password })).body).toMatchObject({ me: { name: 'Ida Thornwick', locale: 'en' } });
  });

  it('lets one in when the link is used twice at once', async () => {
    const token = await invited(newGuest());
    const answers = await Promise.all([accept({ token, password }), accept({ token, password })]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 410]);
  });

  it('lets a person who is known confirm by the password they have, and no other', async () => {
    const token = await invited('inspector@example.test', ['plumber']);
    expect((await read(token)).body).toMatchObject({ name: 'Noor Haverty', hasPassword: true });
    expect((await accept({ token })).body).toMatchObject({ code: 'bad-input', fields: { password: 'required' } });
    expect((await accept({ token, password: 'another password' })).body).toMatchObject({
      code: 'sign-in-failed',
      params: { triesLeft: 4 },
    });
    server.clock.advance(1); // memberships stand in the order they were joined
    const answer = await accept({ token, password, name: 'Somebody Else' });
    expect(answer.body).toMatchObject({
      me: {
        id: world.people.inspector.id,
        name: 'Noor Haverty',
        memberships: [{ roles: ['inspector'] }, { roles: ['plumber'] }],
      },
    });
  });

  it('is over after seven days', async () => {
    const token = await invited(newGuest());
    server.clock.advance(7 * 24 * 60 - 1);
    expect((await read(token)).status).toBe(200);
    server.clock.advance(1);
    expect((await read(token)).body).toMatchObject({ code: 'link-expired' });
    expect((await accept({ token, password })).body).toMatchObject({ code: 'link-expired' });
  });

  it('is refused to a person disabled altogether', async () => {
    await world.people.desk.update({ isDisabled: true });
    const token = await invited('desk@example.test');
    expect((await accept({ token, password })).body).toMatchObject({ code: 'link-expired' });
  });

  it('makes nobody something else than was promised', async () => {
    const token = await invited(newGuest());
    const answer = await accept({ token, password, roles: ['owner'] });
    expect(answer.body).toMatchObject({ code: 'bad-input', fields: { roles: 'unknown' } });
    const { me } = (await accept({ token, password, email: 'other@example.test' })).body as {
      me: { email: string; isOperator: boolean };
    };
    expect(me.email).not.toBe('other@example.test');
    expect(me.isOperator).toBe(false);
  });
});
