import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ClosureModel } from '../departments/closure.model.js';
import { LotModel } from '../lots/lot.model.js';
import { addClosedVisit, addLots, ask, book, nextDay, readVisit, standTest } from '../testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

const calendar = (by: WorldPerson, from = '2027-03-01', to = '2027-03-14', rest = '') =>
  world.as(by).get(`/api/calendar?from=${from}&to=${to}${rest}`);
interface Window {
  date: string;
  label: string;
  room: number;
  roomLeft: number;
  up: number | null;
  isTakeable: boolean;
}
const windowOf = (body: { lanes: Array<{ days: Array<{ windows: Window[] }> }> }, date: string, label: string) =>
  body.lanes[0]?.days.flatMap((day) => day.windows).find((window) => window.date === date && window.label === label);

describe('the calendar', () => {
  it('shows a builder its departments’ windows with the room left, and its visits, closed ones too', async () => {
    const [lot] = await addLots(server, world, 1);
    const past = await addClosedVisit(server, world, lot as LotModel, 'fail', {
      date: '2027-03-01',
      at: '2027-03-01T15:00:00Z',
    });
    const booked = await book(world, world.lots[0]);
    const { body, status } = await calendar('superintendent');
    expect(status).toBe(200);
    expect(body).toMatchObject({ zone: 'America/Denver', today: '2027-03-02' });
    expect(body.lanes).toMatchObject([{ name: 'Tallowmere', isOwn: false, ruleCardVersion: 1 }]);
    expect(body.lanes[0].days).toHaveLength(14);
    expect(windowOf(body, nextDay, 'early')).toMatchObject({ room: 3, roomLeft: 2, up: null, isTakeable: true });
    expect(windowOf(body, '2027-03-02', 'late')).toMatchObject({ isTakeable: false });
    // asked for by 3 pm the working day before, Monday to Thursday (MST, UTC−7; IANA tz): Monday's week begins on the Thursday before it
    expect(windowOf(body, nextDay, 'early')).toMatchObject({ cutoffAt: '2027-03-02T22:00:00.000Z' });
    expect(windowOf(body, '2027-03-08', 'late')).toMatchObject({ cutoffAt: '2027-03-04T22:00:00.000Z' });
    expect(windowOf(body, '2027-03-01', 'early')).toMatchObject({ cutoffAt: '2027-02-25T22:00:00.000Z' });
    expect(body.visits.map(({ id }: { id: string }) => id)).toEqual([past.id, booked.id]);
    expect(body.visits[0]).toMatchObject({ state: 'closed', outcome: { kind: 'fail', reason: null } });
  });

  it('tells how many tests are up to the own department only, and lets it take windows that others cannot ask for any more', async () => {
    const visit = await book(world, world.lots[1], { label: 'mid' });
    await VisitModel.update({ state: 'ready', readyAt: server.clock.now() }, { where: { id: visit.id } });
    for (const by of ['desk', 'inspector', 'departmentOwner'] as const) {
      const { body } = await calendar(by);
      expect(body.lanes[0].isOwn).toBe(true);
      expect(windowOf(body, nextDay, 'mid')).toMatchObject({ up: 1, roomLeft: 2 });
      expect(windowOf(body, '2027-03-02', 'late')).toMatchObject({ isTakeable: true });
    }
    for (const by of ['superintendent', 'plumber'] as const)
      expect(windowOf((await calendar(by)).body, nextDay, 'mid')).toMatchObject({ up: null });
  });

  it('never shows a stranger’s lot: only the room it takes', async () => {
    await LotModel.update({ departmentId: world.organizations.department.id }, { where: { id: world.otherLot.id } });
    const foreign = await ask(world, [world.otherLot.id], { by: 'otherSuperintendent', label: 'noon' });
    expect(foreign.status).toBe(201);
    const { body } = await calendar('superintendent');
    expect(windowOf(body, nextDay, 'noon')).toMatchObject({ roomLeft: 2 });
    expect(JSON.stringify(body)).not.toContain('Sedge Hollow');
    expect(JSON.stringify(body)).not.toContain(world.otherLot.id);
    expect(JSON.stringify((await calendar('otherSuperintendent')).body)).not.toContain('Quillback Rise');
    await VisitModel.update(
      { state: 'withdrawn', endedAt: server.clock.now() },
      { where: { id: foreign.body.visits[0].id } },
    );
    await LotModel.update(
      { departmentId: world.organizations.otherDepartment.id },
      { where: { id: world.otherLot.id } },
    );
  });

  it('shows what is closed and why', async () => {
    const departmentId = world.organizations.department.id;
    await ClosureModel.create({
      id: randomUUID(),
      departmentId,
      date: '2027-03-09',
      fromTime: '09:00',
      toTime: '12:00',
      why: 'Training',
      createdAt: server.clock.now(),
    });
    await ClosureModel.create({
      id: randomUUID(),
      departmentId,
      date: '2027-03-10',
      fromTime: null,
      toTime: null,
      why: 'Move',
      createdAt: server.clock.now(),
    });
    const { days } = (await calendar('superintendent')).body.lanes[0];
    const day = (date: string) => days.find((each: { date: string }) => each.date === date);
    expect(day('2027-03-09')).toMatchObject({
      isWorkingDay: true,
      closed: [{ from: '2027-03-09T16:00:00.000Z', to: '2027-03-09T19:00:00.000Z', why: 'Training' }],
    });
    expect(day('2027-03-09').windows.map(({ label }: Window) => label)).toEqual(['early', 'late']);
    expect(day('2027-03-10')).toMatchObject({
      isWorkingDay: false,
      closed: [{ from: null, to: null, why: 'Move' }],
      windows: [],
    });
    expect(day('2027-03-06')).toMatchObject({ isWorkingDay: false, closed: [], windows: [] });
  });

  it('is of one organization where asked, and only of an own one', async () => {
    expect(
      (
        await calendar(
          'superintendent',
          '2027-03-01',
          '2027-03-07',
          `&organizationId=${world.organizations.builder.id}`,
        )
      ).body.lanes,
    ).toHaveLength(1);
    const foreign = await calendar(
      'superintendent',
      '2027-03-01',
      '2027-03-07',
      `&organizationId=${world.organizations.otherBuilder.id}`,
    );
    expect(foreign.body).toMatchObject({ code: 'not-found' });
  });

  it('is empty for whoever belongs to none, and refuses a span that is none', async () => {
    expect((await calendar('operator')).body).toMatchObject({ lanes: [], visits: [], zone: 'UTC' });
    expect((await calendar('desk', '2027-03-02', '2027-03-01')).body).toMatchObject({
      code: 'bad-input',
      fields: { to: 'ends-before-it-starts' },
    });
    expect((await calendar('desk', '2027-01-01', '2027-12-31')).body).toMatchObject({
      code: 'bad-input',
      fields: { to: 'too-long' },
    });
    expect((await calendar('desk', '2027-01-01', '2027-03-03')).status).toBe(200); // 62 days
  });
});

describe('what stands of a visit', () => {
  it('is a standing test with a reading that counts: not struck, the gauge valve open', async () => {
    const upOf = async (lot: LotModel, id: string) => (
      await standTest(server, world, lot, 'dwv'),
      (await readVisit(world, id)).systemsUp
    );
    const [shut, struck, good] = (await addLots(server, world, 3)) as [LotModel, LotModel, LotModel];
    const ids: string[] = [];
    for (const lot of [shut, struck, good])
      ids.push((await book(world, lot, { date: '2027-03-11', label: 'late' })).id);
    await standTest(server, world, shut, 'water', { valve: 'shut' });
    await standTest(server, world, struck, 'water', { isStruck: true });
    await standTest(server, world, good, 'water');
    const up = (isUp: boolean) => [
      { unitNumber: 1, system: 'dwv', isUp: true },
      { unitNumber: 1, system: 'water', isUp },
    ];
    expect(await upOf(shut, ids[0] as string)).toEqual(up(false));
    expect(await upOf(struck, ids[1] as string)).toEqual(up(false));
    expect(await upOf(good, ids[2] as string)).toEqual(up(true));
  });
});

describe('a lot’s visits', () => {
  it('are read by all three parties, newest first, and by nobody else', async () => {
    const lot = world.lots[4];
    await addClosedVisit(server, world, lot, 'not-ready');
    const booked = await book(world, lot, { date: '2027-03-04' });
    for (const by of ['superintendent', 'builderOwner', 'plumber', 'helper', 'inspector', 'desk'] as const) {
      const { body } = await world.as(by).get(`/api/lots/${lot.id}/visits`);
      expect(body.items.map(({ state }: { state: string }) => state)).toEqual(['booked', 'closed']);
    }
    for (const by of ['otherSuperintendent', 'otherPlumber', 'otherDesk', 'otherInspector', 'operator'] as const) {
      expect((await world.as(by).get(`/api/lots/${lot.id}/visits`)).body.code).toBe('not-found');
      expect((await world.as(by).get(`/api/visits/${booked.id}`)).body.code).toBe('not-found');
    }
    expect((await world.nobody().get(`/api/visits/${booked.id}`)).status).toBe(401);
    expect((await world.as('desk').get('/api/visits/none')).status).toBe(404);
  });
});
