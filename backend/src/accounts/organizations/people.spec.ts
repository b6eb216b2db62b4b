import type { readPeople } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { LedgerEntryModel } from '../../ledger/ledger-entry.model.js';
import { createWorld, type World, type WorldPerson } from '../../testing/fixtures/world.js';
import { join } from '../../testing/fixtures/world.people.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';
import { MembershipModel } from '../membership.model.js';

describe('the people of an organization', () => {
  let server: TestApp;
  let world: World;
  let path: string;
  const change = (by: WorldPerson, whom: WorldPerson, body: object) =>
    world.as(by).patch(`${path}/${world.people[whom].id}`, body);

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    path = `/api/organizations/${world.organizations.builder.id}/people`;
  });
  afterAll(() => server?.close());
  beforeEach(async () => {
    const organizationId = world.organizations.builder.id;
    await MembershipModel.update(
      { roles: ['owner'], isDisabled: false },
      { where: { organizationId, personId: world.people.builderOwner.id } },
    );
    await MembershipModel.update(
      { roles: ['superintendent'], isDisabled: false },
      { where: { organizationId, personId: world.people.superintendent.id } },
    );
  });

  it('are read by every member, managed by the owner, and hidden from everybody else', async () => {
    const read = async (person: WorldPerson) =>
      (await world.as(person).get(path)).body as RouteAnswer<typeof readPeople>;
    const asMember = await read('superintendent');
    expect(asMember).toMatchObject({
      organization: { name: 'Odderly Homes' },
      abilities: { canManage: false },
      invitations: [],
    });
    expect(asMember.people.map((person) => [person.name, person.roles, person.isDisabled])).toEqual([
      ['Della Arkwright', ['superintendent'], false],
      ['Enid Odderly', ['owner'], false],
    ]);
    expect((await read('builderOwner')).abilities.canManage).toBe(true);
    // parties of the same lots, strangers, the operator: it is not there for them
    for (const person of ['plumber', 'plumberOwner', 'desk', 'otherBuilderOwner', 'operator'] as const) {
      expect(await read(person)).toMatchObject({ code: 'not-found' });
      expect((await change(person, 'superintendent', { isDisabled: true })).body).toMatchObject({ code: 'not-found' });
    }
    expect((await world.nobody().get(path)).status).toBe(401);
    expect((await world.as('builderOwner').get('/api/organizations/no-id/people')).status).toBe(404);
  });

  it('are changed by the owner only, with a record', async () => {
    const refused = await change('superintendent', 'superintendent', { roles: ['owner'] });
    expect(refused.body).toMatchObject({ code: 'not-allowed' });
    const changed = await change('builderOwner', 'superintendent', { roles: ['superintendent', 'owner', 'owner'] });
    expect(changed.body).toMatchObject({
      name: 'Della Arkwright',
      roles: ['superintendent', 'owner'],
      isDisabled: false,
    });
    const entries = await LedgerEntryModel.findAll({
      where: { scope: `organization:${world.organizations.builder.id}` },
    });
    expect(entries.at(-1)).toMatchObject({
      kind: 'person-changed',
      actorId: world.people.builderOwner.id,
      actorRole: 'owner',
      payload: { personId: world.people.superintendent.id, roles: ['superintendent', 'owner'] },
    });
  });

  it('have roles of their kind of organization', async () => {
    const answer = await change('builderOwner', 'superintendent', { roles: ['superintendent', 'inspector'] });
    expect(answer.body).toMatchObject({ code: 'bad-input', fields: { 'roles.1': 'not-one-of-the-choices' } });
    expect((await change('builderOwner', 'superintendent', { roles: [] })).body).toMatchObject({
      fields: { roles: 'required' },
    });
  });

  it('must be people of this organization', async () => {
    expect((await change('builderOwner', 'plumber', { isDisabled: true })).body).toMatchObject({ code: 'not-found' });
  });

  it('keep one owner who can act', async () => {
    expect((await change('builderOwner', 'builderOwner', { isDisabled: true })).body).toMatchObject({
      code: 'last-owner',
    });
    expect((await change('builderOwner', 'builderOwner', { roles: ['superintendent'] })).body).toMatchObject({
      code: 'last-owner',
    });
    await change('builderOwner', 'superintendent', { roles: ['owner'] });
    expect((await change('builderOwner', 'builderOwner', { roles: ['superintendent'] })).status).toBe(200);
    expect((await change('superintendent', 'superintendent', { isDisabled: true })).body).toMatchObject({
      code: 'last-owner',
    });
  });

  it('keep one owner when two take each other’s role at once', async () => {
    await change('builderOwner', 'superintendent', { roles: ['owner'] });
    const answers = await Promise.all([
      change('builderOwner', 'superintendent', { isDisabled: true }),
      change('superintendent', 'builderOwner', { isDisabled: true }),
    ]);
    const owners = await MembershipModel.count({
      where: { organizationId: world.organizations.builder.id, isDisabled: false },
    });
    expect(owners).toBe(1);
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1);
  });

  it('are out at once when disabled, here and nowhere else', async () => {
    await join(world.people.superintendent, world.organizations.otherPlumber, ['plumber'], server.clock.now());
    const token = world.tokenOf('superintendent');
    const statusOf = async (of: string) =>
      (await world.nobody().get(of, { headers: { Authorization: `Bearer ${token}` } })).status;
    expect(await statusOf(path)).toBe(200);
    expect((await change('builderOwner', 'superintendent', { isDisabled: true })).body).toMatchObject({
      isDisabled: true,
    });
    expect(await statusOf(path)).toBe(404);
    expect(await statusOf(`/api/organizations/${world.organizations.otherPlumber.id}/people`)).toBe(200);
    expect((await change('builderOwner', 'superintendent', { isDisabled: false })).body).toMatchObject({
      isDisabled: false,
    });
    expect(await statusOf(path)).toBe(200);
  });
});
