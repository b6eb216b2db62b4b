import { randomUUID } from 'node:crypto';
import type { Invitation } from '@holdwater/shared-types/accounts/organizations.contract.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { LedgerEntryModel } from '../../ledger/ledger-entry.model.js';
import { accountMailsTo, mailedTokenOf } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../../testing/test-app.js';
import { InvitationModel } from '../invitation.model.js';

const ida = { email: 'Ida@example.test', name: 'Ida Thornwick', roles: ['helper'] };

describe('inviting', () => {
  let server: TestApp;
  let world: World;
  let path: string;
  const invite = (body: object = ida) => world.as('plumberOwner').post(`${path}/invitations`, body);
  const openOnes = async () =>
    ((await world.as('plumberOwner').get(`${path}/people`)).body as { invitations: Invitation[] }).invitations;

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    path = `/api/organizations/${world.organizations.plumber.id}`;
  });
  afterAll(() => server?.close());
  beforeEach(async () => {
    server.clock.set(testNow);
    await server.db.query('DELETE FROM link_tokens; DELETE FROM invitations; DELETE FROM outbox_events');
  });

  it('mails a link that is good for seven days, and keeps a record', async () => {
    const answer = await invite();
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      email: 'ida@example.test',
      name: 'Ida Thornwick',
      roles: ['helper'],
      expiresAt: '2027-03-09T16:30:00.000Z',
    });
    expect(await accountMailsTo('ida@example.test')).toMatchObject([
      { mail: 'invitation', organizationName: 'Dunlatch Plumbing', invitedByName: 'Mabel Dunlatch', locale: 'en' },
    ]);
    expect(JSON.stringify(answer.body)).not.toContain(await mailedTokenOf(server, 'ida@example.test'));
    const entries = await LedgerEntryModel.findAll({
      where: { scope: `organization:${world.organizations.plumber.id}` },
    });
    expect(entries.at(-1)).toMatchObject({
      kind: 'person-invited',
      actorRole: 'owner',
      payload: { email: 'ida@example.test', roles: ['helper'] },
    });
    expect(await openOnes()).toMatchObject([{ email: 'ida@example.test' }]);
  });

  it('is the owner’s', async () => {
    expect((await world.as('plumber').post(`${path}/invitations`, ida)).body).toMatchObject({ code: 'not-allowed' });
    for (const person of ['superintendent', 'builderOwner', 'otherPlumberOwner', 'operator'] as const) {
      expect((await world.as(person).post(`${path}/invitations`, ida)).body).toMatchObject({ code: 'not-found' });
    }
    expect((await world.nobody().post(`${path}/invitations`, ida)).status).toBe(401);
    expect(await InvitationModel.count()).toBe(0);
  });

  it('refuses a role of another kind of organization', async () => {
    const answer = await invite({ ...ida, roles: ['helper', 'desk'] });
    expect(answer.body).toMatchObject({ code: 'bad-input', fields: { 'roles.1': 'not-one-of-the-choices' } });
  });

  it('refuses a member and an address invited already, also when both come at once', async () => {
    expect((await invite({ ...ida, email: 'HELPER@example.test' })).body).toMatchObject({ code: 'already-member' });
    const answers = await Promise.all([invite(), invite()]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
    expect((await invite()).body).toMatchObject({ code: 'already-member' });
    expect(await accountMailsTo('ida@example.test')).toHaveLength(1);
  });

  it('may be done anew once the first ran out', async () => {
    await invite();
    server.clock.advance(7 * 24 * 60);
    expect(await openOnes()).toEqual([]);
    expect((await invite()).status).toBe(201);
    expect(await openOnes()).toHaveLength(1);
  });

  it('can be taken back by the owner, once', async () => {
    const { id } = (await invite()).body as Invitation;
    const withdraw = (by: 'plumberOwner' | 'plumber' | 'otherPlumberOwner', which = id) =>
      world.as(by).delete(`${path}/invitations/${which}`);
    expect((await withdraw('plumber')).body).toMatchObject({ code: 'not-allowed' });
    expect((await withdraw('otherPlumberOwner')).body).toMatchObject({ code: 'not-found' });
    const elsewhere = `/api/organizations/${world.organizations.otherPlumber.id}/invitations/${id}`;
    expect((await world.as('otherPlumberOwner').delete(elsewhere)).body).toMatchObject({ code: 'not-found' });
    expect((await withdraw('plumberOwner')).body).toEqual({ done: true });
    expect((await withdraw('plumberOwner')).body).toMatchObject({ code: 'not-found' });
    expect((await withdraw('plumberOwner', randomUUID())).body).toMatchObject({ code: 'not-found' });
    const token = await mailedTokenOf(server, 'ida@example.test');
    expect((await world.nobody().post('/api/auth/invitation', { token })).body).toMatchObject({ code: 'link-expired' });
    const entries = await LedgerEntryModel.findAll({ where: { kind: 'invitation-withdrawn' } });
    expect(entries).toMatchObject([{ payload: { email: 'ida@example.test' } }]);
    expect((await invite()).status).toBe(201);
  });
});
