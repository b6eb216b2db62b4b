import { me } from '@holdwater/shared-types/accounts/person.contract.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { join } from '../../testing/fixtures/world.people.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';
import { MembershipModel } from '../membership.model.js';

describe('one’s own account', () => {
  let server: TestApp;
  let world: World;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());

  it('says who one is and where one belongs, and nothing secret', async () => {
    const answer = await world.as('inspector').get('/api/me');
    expect(me.parse(answer.body)).toEqual(answer.body);
    expect(answer.body).toEqual({
      id: world.people.inspector.id,
      name: 'Noor Haverty',
      email: 'inspector@example.test',
      phone: '555-0110',
      locale: 'en',
      units: 'us',
      isOperator: false,
      memberships: [
        {
          organization: {
            id: world.organizations.department.id,
            name: 'Tallowmere',
            kind: 'department',
            phone: '555-0102',
          },
          roles: ['inspector'],
        },
      ],
    });
  });

  it('names every organization in force, in the order one joined', async () => {
    const later = new Date(server.clock.now().getTime() + 60_000);
    const second = await join(
      world.people.superintendent,
      world.organizations.otherPlumber,
      ['plumber', 'owner'],
      later,
    );
    const names = async () => {
      const { memberships } = me.parse((await world.as('superintendent').get('/api/me')).body);
      return memberships.map(({ organization }) => organization.name);
    };
    expect(await names()).toEqual(['Odderly Homes', 'Merrow']);
    await MembershipModel.update({ isDisabled: true }, { where: { id: second.id } });
    expect(await names()).toEqual(['Odderly Homes']);
  });

  it('changes what is given and nothing else', async () => {
    const changed = await world.as('helper').patch('/api/me', { locale: 'es', units: 'metric', phone: null });
    expect(changed.body).toMatchObject({ name: 'Jory Tamsin', locale: 'es', units: 'metric', phone: null });
    expect((await world.as('helper').get('/api/me')).body).toEqual(changed.body);
    expect((await world.as('plumber').get('/api/me')).body).toMatchObject({ locale: 'en', units: 'us' });
    expect((await world.as('helper').patch('/api/me', {})).body).toEqual(changed.body);
  });

  it('gives a repeated change its first answer', async () => {
    const first = await world.as('helper').patch('/api/me', { name: 'Jory T.' }, { key: 'repeated-key-1' });
    await world.as('helper').patch('/api/me', { name: 'Jory Tamsin' });
    const repeated = await world.as('helper').patch('/api/me', { name: 'Jory T.' }, { key: 'repeated-key-1' });
    expect(repeated.body).toEqual(first.body);
    expect((await world.as('helper').get('/api/me')).body).toMatchObject({ name: 'Jory Tamsin' });
  });

  it.each([
    [{ name: ' ' }, 'name'],
    [{ phone: 'call me' }, 'phone'],
    [{ locale: 'fr' }, 'locale'],
    [{ isOperator: true }, 'isOperator'],
    [{ email: 'other@example.test' }, 'email'],
  ])('refuses %j', async (body, field) => {
    const answer = await world.as('helper').patch('/api/me', body);
    expect(answer.body).toMatchObject({ code: 'bad-input' });
    expect((answer.body as { fields: object }).fields).toHaveProperty(field);
  });

  it('is nobody’s when signed out', async () => {
    expect((await world.nobody().get('/api/me')).body).toMatchObject({ code: 'signed-out' });
    expect((await world.nobody().patch('/api/me', { name: 'X' })).body).toMatchObject({ code: 'signed-out' });
  });
});
