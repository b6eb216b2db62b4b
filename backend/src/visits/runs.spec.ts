import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MembershipModel } from '../accounts/membership.model.js';
import { ask, book, nextDay, standTest } from '../testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
let visits: VisitSummary[];
const gil: WorldPerson = 'secondInspector';
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  visits = [];
  for (const [index, label] of ['late', 'early', 'mid'].entries())
    visits.push(await book(world, world.lots[index] ?? world.lots[0], { label }));
});
afterAll(() => server?.close());

const run = (by: WorldPerson, query = '') => world.as(by).get(`/api/runs?date=${nextDay}${query}`);
const board = (by: WorldPerson, date = nextDay) =>
  world.as(by).get(`/api/departments/${world.organizations.department.id}/day?date=${date}`);

describe('a run', () => {
  it('is the inspector’s own visits of the day in planned order', async () => {
    const { body } = await run(gil);
    expect(body).toMatchObject({ date: nextDay, zone: 'America/Denver', inspector: { name: 'Gil Strand' } });
    expect(
      body.stops.map(({ order, visit }: { order: number; visit: VisitSummary }) => [order, visit.window.label]),
    ).toEqual([
      [1, 'early'],
      [2, 'mid'],
      [3, 'late'],
    ]);
    expect((await run('inspector')).body.stops).toEqual([]);
  });

  it('is of today by the department’s calendar, unless asked for another day', async () => {
    expect((await world.as(gil).get('/api/runs')).body).toMatchObject({ date: '2027-03-02', stops: [] });
    server.clock.set('2027-03-03T05:30:00Z'); // still Tuesday evening in Denver
    expect((await world.as(gil).get('/api/runs')).body.date).toBe('2027-03-02');
    server.clock.set(testNow);
  });

  it('gives the gate code on the day and to the one who comes', async () => {
    expect((await run(gil)).body.stops[0].access).toBeNull();
    server.clock.set('2027-03-03T13:00:00Z');
    expect((await run(gil)).body.stops[0].access).toMatchObject({ gateCode: '4471', contactName: 'Site office' });
    expect((await run('desk', `&inspectorId=${world.people[gil].id}`)).body.stops[0].access).toBeNull();
    server.clock.set(testNow);
  });

  it('asks what the rule card asks, then what the test was started for; never a forecast', async () => {
    const asks = async () => (await run(gil)).body.stops[0].asks;
    expect(await asks()).toEqual([
      { unitNumber: 1, system: 'dwv', method: null, minimumPsi: null, levelFt: null },
      { unitNumber: 1, system: 'water', method: null, minimumPsi: 100, levelFt: null },
    ]);
    await standTest(server, world, world.lots[1], 'dwv');
    await standTest(server, world, world.lots[1], 'water');
    expect(await asks()).toEqual([
      { unitNumber: 1, system: 'dwv', method: 'stack-to-roof', minimumPsi: null, levelFt: 24 },
      { unitNumber: 1, system: 'water', method: 'gauge', minimumPsi: 110, levelFt: null },
    ]);
  });

  it('is the desk’s to see of anyone in the department, nobody else’s', async () => {
    const ofGil = `&inspectorId=${world.people[gil].id}`;
    expect((await run('desk', ofGil)).body.stops).toHaveLength(3);
    expect((await run('desk')).body.inspector.name).toBe('Gil Strand');
    expect((await run('inspector', ofGil)).body.code).toBe('not-allowed');
    expect((await run('departmentOwner')).body.code).toBe('not-allowed');
    expect((await run('desk', `&inspectorId=${world.people.otherInspector.id}`)).body.code).toBe('not-found');
    expect((await run('otherDesk', `${ofGil}&departmentId=${world.organizations.department.id}`)).body.code).toBe(
      'not-found',
    );
    expect((await run('otherDesk', ofGil)).body.code).toBe('not-found');
    for (const by of ['superintendent', 'plumber', 'operator'] as const)
      expect((await run(by)).body.code).toBe('not-found');
  });
});

describe('the day board', () => {
  it('shows every inspector, with or without visits, and the room of the day', async () => {
    const { body } = await board('desk');
    expect(
      body.inspectors.map(({ name, visits: own }: { name: string; visits: unknown[] }) => [name, own.length]),
    ).toEqual([
      ['Gil Strand', 3],
      ['Noor Haverty', 0],
    ]);
    expect(
      body.day.windows.map(({ label, roomLeft, up }: { label: string; roomLeft: number; up: number }) => [
        label,
        roomLeft,
        up,
      ]),
    ).toEqual([
      ['early', 2, 0],
      ['mid', 2, 0],
      ['noon', 3, 0],
      ['late', 2, 0],
    ]);
  });

  it('shows the requests that want the day, and keeps visits of who has left', async () => {
    await VisitModel.update(
      { state: 'requested', place: null, inspectorId: null, planned: null },
      { where: { id: visits[0]?.id } },
    );
    await MembershipModel.update({ isDisabled: true }, { where: { personId: world.people[gil].id } });
    const { body } = await board('desk');
    expect(body.requests.map(({ id }: VisitSummary) => id)).toEqual([visits[0]?.id]);
    expect(
      body.inspectors.map(({ name, visits: own }: { name: string; visits: unknown[] }) => [name, own.length]),
    ).toEqual([
      ['Noor Haverty', 0],
      ['Gil Strand', 2],
    ]);
    expect((await board('desk', '2027-03-04')).body.requests).toEqual([]);
    await MembershipModel.update({ isDisabled: false }, { where: { personId: world.people[gil].id } });
  });

  it('and the pile of requests are the desk’s', async () => {
    const pile = (by: WorldPerson) =>
      world.as(by).get(`/api/departments/${world.organizations.department.id}/requests`);
    for (const read of [board, pile]) {
      for (const by of ['inspector', 'departmentOwner'] as const)
        expect((await read(by)).body.code).toBe('not-allowed');
      for (const by of ['superintendent', 'plumber', 'otherDesk', 'operator'] as const)
        expect((await read(by)).body.code).toBe('not-found');
    }
    expect((await pile('desk')).body.items).toHaveLength(1);
  });

  it('the pile is in order: not reached first, then the oldest', async () => {
    const other = `/api/departments/${world.organizations.otherDepartment.id}/requests`;
    const older = (await ask(world, [world.otherLot.id], { by: 'otherSuperintendent', stageCode: 'groundwork' })).body
      .visits[0];
    server.clock.advance(5);
    const newer = (await ask(world, [world.otherLot.id], { by: 'otherSuperintendent', stageCode: 'rough-in' })).body
      .visits[0];
    const order = async () => (await world.as('otherDesk').get(other)).body.items.map(({ id }: VisitSummary) => id);
    expect(await order()).toEqual([older.id, newer.id]);
    await VisitModel.update({ hasFirstPlace: true }, { where: { id: newer.id } });
    expect(await order()).toEqual([newer.id, older.id]);
  });
});
