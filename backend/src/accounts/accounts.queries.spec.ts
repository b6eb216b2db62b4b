import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { join } from '../testing/fixtures/world.people.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { AccountsCleanup } from './accounts-cleanup.js';
import { AccountsQueries } from './accounts.queries.js';
import { SessionModel } from './session.model.js';
import { Sessions } from './sessions/sessions.service.js';
import { MembershipModel } from './membership.model.js';

describe('reading people and organizations', () => {
  let server: TestApp;
  let world: World;
  let queries: AccountsQueries;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    queries = server.get(AccountsQueries);
  });
  afterAll(() => server?.close());

  it('lists who is in force, by name, with one of the roles asked for', async () => {
    const { department, plumber } = world.organizations;
    const names = async (...args: Parameters<AccountsQueries['listMembers']>) =>
      (await queries.listMembers(...args)).map((member) => member.name);
    expect(await names([department.id])).toEqual(['Gil Strand', 'Noor Haverty', 'Orla Finnick', 'Wes Pomfret']);
    expect(await names([department.id], ['inspector'])).toEqual(['Gil Strand', 'Noor Haverty']);
    expect(await names([department.id, plumber.id], ['desk', 'helper'])).toEqual(['Jory Tamsin', 'Wes Pomfret']);
    expect(await names([], ['desk'])).toEqual([]);
    expect(await names([department.id], [])).toEqual([]);
    await world.people.secondInspector.update({ isDisabled: true });
    await MembershipModel.update({ isDisabled: true }, { where: { personId: world.people.desk.id } });
    expect(await names([department.id])).toEqual(['Noor Haverty', 'Orla Finnick']);
  });

  it('names a person once for each organization', async () => {
    await join(world.people.plumber, world.organizations.otherPlumber, ['helper'], server.clock.now());
    const members = await queries.listMembers(
      [world.organizations.plumber.id, world.organizations.otherPlumber.id],
      ['plumber', 'helper'],
    );
    const mine = members.filter((member) => member.id === world.people.plumber.id);
    expect(new Set(mine.map((member) => member.organizationId)).size).toBe(2);
  });

  it('gets people and organizations by id, and says when one is not there', async () => {
    const { plumber, secondInspector } = world.people;
    const persons = await queries.getPersons([plumber.id, plumber.id, secondInspector.id]);
    expect(persons.get(plumber.id)).toMatchObject({
      name: 'Ruben Achterberg',
      email: 'plumber@example.test',
      locale: 'en',
      isDisabled: false,
    });
    expect(persons.get(secondInspector.id)).toMatchObject({ isDisabled: true });
    expect((await queries.getPersons([])).size).toBe(0);
    await expect(queries.getPersons([randomUUID()])).rejects.toThrowError(/there is no row/);
    const organizations = await queries.getOrganizations([world.organizations.builder.id]);
    expect([...organizations.values()]).toMatchObject([{ name: 'Odderly Homes', kind: 'builder' }]);
    await expect(queries.getOrganizations([randomUUID()])).rejects.toThrowError(/there is no row/);
    expect(await queries.findOrganization(randomUUID())).toBeNull();
  });

  it('forgets sessions thirty days after their end, and none before', async () => {
    const sessions = server.get(Sessions);
    await sessions.open(world.people.inspector.id);
    await sessions.endAllOf(world.people.inspector.id, 'signed-out');
    const count = () => SessionModel.count({ where: { personId: world.people.inspector.id } });
    const before = await count();
    server.clock.advance(30 * 24 * 60 - 1);
    await server.get(AccountsCleanup).clean();
    expect(await count()).toBe(before);
    server.clock.advance(2);
    await server.get(AccountsCleanup).clean();
    expect(await count()).toBe(0);
    expect(await SessionModel.count()).toBeGreaterThan(0);
  });
});
