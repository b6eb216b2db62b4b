import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { type AddedClosure, ClosureEffects } from './closure-effects.js';
import { WorkingTimeQueries } from './working-time.queries.js';

let server: TestApp;
let world: World;
let path: string;
const effects: AddedClosure[] = [];
let isEffectFailing = false;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  path = `/api/departments/${world.organizations.department.id}/closures`;
  server.get(ClosureEffects).register({
    afterClosureAdded: async (closure) => {
      if (isEffectFailing) throw new Error('a listener that fails');
      effects.push(closure);
    },
  });
});
afterAll(() => server.close());

const whole = { date: '2027-03-10', from: null, to: null, why: 'Staff training' };

describe('closures', () => {
  it('lets the desk close a day, and a part of one, and tells whoever has to act on it', async () => {
    const day = await world.as('desk').post(path, whole);
    expect(day.status).toBe(201);
    const span = await world.as('desk').post(path, { date: '2027-03-09', from: '12:00', to: '14:00', why: 'Funeral' });
    expect(span.body).toMatchObject({ date: '2027-03-09', from: '12:00', to: '14:00' });
    expect(effects).toMatchObject([
      { ...whole, departmentId: world.organizations.department.id, zone: 'America/Denver', actor: { role: 'desk' } },
      { from: '12:00', to: '14:00' },
    ]);
    const { body } = await world.as('plumber').get(`/api/departments/${world.organizations.department.id}`);
    expect(body.closures.map((each: { date: string }) => each.date)).toEqual(['2027-03-09', '2027-03-10']);
  });

  it('takes the closed day out of the windows, and of a closed span those that overlap it', async () => {
    const windows = await server
      .get(WorkingTimeQueries)
      .windowsBetween(world.organizations.department.id, '2027-03-08', '2027-03-11');
    const labels = (date: string) => windows.filter((window) => window.date === date).map(({ label }) => label);
    expect(labels('2027-03-08')).toEqual(['early', 'mid', 'noon', 'late']);
    expect(labels('2027-03-09')).toEqual(['early', 'mid']);
    expect(labels('2027-03-10')).toEqual([]);
  });

  it('tells what is closed on a day in instants of the department', async () => {
    const workingTime = server.get(WorkingTimeQueries);
    // Denver is seven hours behind UTC until the 14th of March 2027 (15 U.S.C. 260a)
    expect(await workingTime.closedOn(world.organizations.department.id, '2027-03-09')).toEqual({
      date: '2027-03-09',
      isWorkingDay: true,
      closed: [{ from: '2027-03-09T19:00:00.000Z', to: '2027-03-09T21:00:00.000Z', why: 'Funeral', holidayCode: null }],
    });
    expect(await workingTime.closedOn(world.organizations.department.id, '2027-03-10')).toMatchObject({
      isWorkingDay: false,
      closed: [{ from: null, to: null, why: 'Staff training' }],
    });
  });

  it.each([
    ['a day gone by', { ...whole, date: '2027-03-01' }, { date: 'in-the-past' }],
    ['an end before its start', { ...whole, from: '14:00', to: '12:00' }, { to: 'ends-before-it-starts' }],
    ['half a span', { ...whole, from: '14:00' }, { to: 'both-or-neither' }],
    ['no reason', { ...whole, why: ' ' }, { why: 'required' }],
  ])('refuses %s', async (_, closure, fields) => {
    expect((await world.as('desk').post(path, closure)).body).toMatchObject({ code: 'bad-input', fields });
  });

  it('lets nobody else close or open', async () => {
    const { body } = await world.as('desk').get(`/api/departments/${world.organizations.department.id}`);
    const closureId: string = body.closures[0].id;
    for (const person of [
      'inspector',
      'departmentOwner',
      'superintendent',
      'plumber',
      'otherDesk',
      'operator',
    ] as const) {
      expect((await world.as(person).post(path, whole)).body.code).toBe('not-allowed');
      expect((await world.as(person).delete(`${path}/${closureId}`)).body.code).toBe('not-allowed');
    }
    expect((await world.nobody().post(path, whole)).status).toBe(401);
  });

  it('opens the day again, once', async () => {
    const { body } = await world.as('desk').post(path, { ...whole, date: '2027-03-15' });
    expect((await world.as('desk').delete(`${path}/${body.id}`)).body).toEqual({ done: true });
    expect((await world.as('desk').delete(`${path}/${body.id}`)).body.code).toBe('not-found');
    const day = await server.get(WorkingTimeQueries).closedOn(world.organizations.department.id, '2027-03-15');
    expect(day).toEqual({ date: '2027-03-15', isWorkingDay: true, closed: [] });
  });

  it('does not find the closure of another department', async () => {
    const { body } = await world
      .as('otherDesk')
      .post(`/api/departments/${world.organizations.otherDepartment.id}/closures`, whole);
    expect((await world.as('desk').delete(`${path}/${body.id}`)).body.code).toBe('not-found');
  });

  it('is undone when what it does to visits cannot be done', async () => {
    isEffectFailing = true;
    expect((await world.as('desk').post(path, { ...whole, date: '2027-03-22' })).status).toBe(500);
    isEffectFailing = false;
    expect(
      (await server.get(WorkingTimeQueries).closedOn(world.organizations.department.id, '2027-03-22')).closed,
    ).toEqual([]);
  });
});
