import { randomUUID } from 'node:crypto';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { TestUpModel } from '../holds/test-up.model.js';
import type { LotModel } from '../lots/lot.model.js';
import { addLots, ask, book, nextDay, readVisit } from '../testing/fixtures/visits.js';
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

const newVisit = async (label = 'early', date = nextDay) => {
  const [lot] = await addLots(server, world, 1);
  return book(world, lot as LotModel, { label, date });
};
const act = (visit: VisitSummary, path: string, body: object, by: WorldPerson) =>
  world.as(by).post(`/api/visits/${visit.id}/${path}`, { expectedVersion: visit.version, ...body });
const eventsOf = (visitId: string) =>
  server.db.query<{ kind: string; payload: Record<string, unknown> }>(
    'SELECT kind, payload FROM outbox_events WHERE visit_id = :visitId ORDER BY position',
    { replacements: { visitId }, type: QueryTypes.SELECT },
  );
const ledgerOf = (visitId: string) =>
  server.db.query<{ kind: string; actorRole: string | null; payload: Record<string, unknown> }>(
    `SELECT kind, actor_role AS "actorRole", payload FROM ledger_entries WHERE payload ->> 'visitId' = :visitId ORDER BY lot_id, sequence`,
    { replacements: { visitId }, type: QueryTypes.SELECT },
  );

const ways = [
  { path: 'withdraw', body: { reason: 'weather', note: 'Rain till Friday' }, by: 'superintendent', to: 'withdrawn' },
  { path: 'free', body: { reason: 'Road closed' }, by: 'desk', to: 'freed' },
  { path: 'not-reached', body: {}, by: 'desk', to: 'requested' },
] as const;

describe.each(ways)('$path', ({ path, body, by, to }) => {
  it(`leads to ${to}, written down and told once, and takes the entry out of the calendars`, async () => {
    const visit = await newVisit();
    const answer = await act(visit, path, body, by);
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ state: to, version: 1 });
    const kind = `visit-${path === 'not-reached' ? 'not-reached' : to}`;
    const events = await eventsOf(visit.id);
    expect(events.map((event) => event.kind)).toEqual(['visit-booked', kind]);
    expect(events[1]?.payload).toMatchObject({
      visit: { calendarSequence: 1, startAt: visit.window.startAt, inspectorName: 'Gil Strand' },
    });
    expect((await ledgerOf(visit.id)).map((entry) => entry.kind)).toEqual(['visit-requested', 'visit-booked', kind]);
  });

  it('gives the room back', async () => {
    const visits = [await newVisit('noon'), await newVisit('noon'), await newVisit('noon')];
    const [lot] = await addLots(server, world, 1);
    expect((await ask(world, [(lot as LotModel).id], { label: 'noon' })).body.code).toBe('window-full');
    await act(visits[1] as VisitSummary, path, body, by);
    const again = await ask(world, [(lot as LotModel).id], { label: 'noon' });
    expect(again.status).toBe(201);
    expect((await VisitModel.findByPk(again.body.visits[0].id))?.place).toBe(2);
    for (const { id } of [...visits, again.body.visits[0]])
      await VisitModel.update({ state: 'withdrawn', endedAt: server.clock.now() }, { where: { id } });
  });

  it('is refused by another version, and once it is over', async () => {
    const visit = await newVisit('late', '2027-03-04');
    expect((await act(visit, path, { ...body, expectedVersion: 7 }, by)).body).toMatchObject({
      code: 'stale-state',
      params: { is: 'booked', version: 0 },
    });
    await VisitModel.update({ state: 'closed', endedAt: server.clock.now() }, { where: { id: visit.id } });
    expect((await act(visit, path, body, by)).body).toMatchObject({ code: 'stale-state', params: { is: 'closed' } });
  });

  it('is for those who may, and 404 for strangers', async () => {
    const visit = await newVisit('late', '2027-03-08');
    const others = (
      ['superintendent', 'helper', 'inspector', 'desk', 'builderOwner', 'departmentOwner'] as const
    ).filter((who) => who !== by && !(path === 'withdraw' && who === 'desk'));
    for (const who of others) expect((await act(visit, path, body, who)).body).toMatchObject({ code: 'not-allowed' });
    for (const who of ['otherSuperintendent', 'otherPlumber', 'otherDesk', 'operator'] as const) {
      expect((await act(visit, path, body, who)).body).toMatchObject({ code: 'not-found' });
    }
    expect(await readVisit(world, visit.id)).toMatchObject({ state: 'booked', version: 0 });
    await VisitModel.update({ state: 'withdrawn', endedAt: server.clock.now() }, { where: { id: visit.id } });
  });
});

describe('a withdrawal', () => {
  it('is the desk’s too, whoever asked for the visit, and is written down as the desk’s', async () => {
    const visit = await newVisit('mid');
    expect((await readVisit(world, visit.id, 'desk')).moves).toContain('withdraw');
    const answer = await act(visit, 'withdraw', { reason: 'plans-changed', note: 'They called' }, 'desk');
    expect(answer.body).toMatchObject({ state: 'withdrawn', endReason: 'plans-changed', endNote: 'They called' });
    expect((await ledgerOf(visit.id)).at(-1)).toMatchObject({ kind: 'visit-withdrawn', actorRole: 'desk' });
  });

  it('says why, and whether there was anything in a calendar', async () => {
    const visit = await newVisit('mid');
    expect((await act(visit, 'withdraw', { reason: 'weather', note: 'Rain' }, 'plumber')).body).toMatchObject({
      endReason: 'weather',
      endNote: 'Rain',
    });
    expect((await eventsOf(visit.id)).at(-1)).toMatchObject({ payload: { reason: 'weather', wasBooked: true } });
    expect((await ledgerOf(visit.id)).at(-1)).toMatchObject({
      kind: 'visit-withdrawn',
      actorRole: 'plumber',
      payload: { reason: 'weather' },
    });
    expect((await act(await newVisit('mid'), 'withdraw', { reason: 'bored' }, 'superintendent')).body).toMatchObject({
      code: 'bad-input',
    });
  });
});

describe('a request that is declined', () => {
  it('by the desk with its reason; nothing was in a calendar, nothing is taken out', async () => {
    const [request] = (await ask(world, [world.otherLot.id], { by: 'otherSuperintendent' })).body.visits as [
      VisitSummary,
    ];
    expect((await act(request, 'decline', { reason: '' }, 'otherDesk')).body).toMatchObject({
      code: 'bad-input',
      fields: { reason: 'required' },
    });
    expect((await act(request, 'decline', { reason: 'No' }, 'otherSuperintendent')).body.code).toBe('not-allowed');
    const answer = await act(request, 'decline', { reason: 'Call the county' }, 'otherDesk');
    expect(answer.body).toMatchObject({ state: 'declined', endReason: 'Call the county', moves: [] });
    expect((await eventsOf(request.id)).at(-1)).toMatchObject({
      kind: 'visit-declined',
      payload: { reason: 'Call the county', visit: { calendarSequence: 0 } },
    });
    expect((await ledgerOf(request.id)).map(({ kind }) => kind)).toEqual(['visit-requested', 'visit-declined']);
  });

  it('not once it is booked', async () => {
    const visit = await newVisit('late');
    expect((await act(visit, 'decline', { reason: 'Late' }, 'desk')).body).toMatchObject({
      code: 'stale-state',
      params: { is: 'booked' },
    });
  });
});

describe('a visit not reached', () => {
  it('keeps first place among the requests, is placed again under the same calendar identity', async () => {
    const visit = await newVisit('early', '2027-03-04');
    const { calendarUid, ruleCardId } = await VisitModel.findByPk(visit.id, { rejectOnEmpty: true });
    const back = await act(visit, 'not-reached', { note: 'Flat tire' }, 'desk');
    expect(back.body).toMatchObject({
      state: 'requested',
      hasFirstPlace: true,
      inspector: null,
      plannedStartAt: null,
      endNote: 'Flat tire',
    });
    expect((await eventsOf(visit.id)).at(-1)).toMatchObject({
      payload: { visit: { formerInspectorId: world.people.secondInspector.id } },
    });
    const pile = await world.as('desk').get(`/api/departments/${world.organizations.department.id}/requests`);
    expect(pile.body.items[0]).toMatchObject({ hasFirstPlace: true });
    const placed = await act(back.body, 'place', { date: '2027-03-09', label: 'early' }, 'desk');
    expect(placed.body).toMatchObject({ state: 'booked', endNote: null, endReason: null });
    const row = await VisitModel.findByPk(visit.id, { rejectOnEmpty: true });
    expect(row).toMatchObject({ calendarUid, ruleCardId, calendarSequence: 2 });
  });

  it('from ready or underway too: what was said of the test ended with the window', async () => {
    const visit = await newVisit('late', '2027-03-09');
    const now = server.clock.now();
    await VisitModel.update(
      { state: 'underway', readyAt: now, begunAt: now, begunBy: world.people.inspector.id, begunFrom: 'ready' },
      { where: { id: visit.id } },
    );
    await TestUpModel.create({
      id: randomUUID(),
      clientId: randomUUID(),
      visitId: visit.id,
      saidBy: world.people.plumber.id,
      saidAt: now,
      receivedAt: now,
      readingIds: [randomUUID()],
    });
    expect((await act(visit, 'not-reached', {}, 'desk')).body).toMatchObject({ state: 'requested', upSince: null });
    expect(await VisitModel.findByPk(visit.id)).toMatchObject({
      begunAt: null,
      begunBy: null,
      begunFrom: null,
      readyAt: null,
    });
    expect(await TestUpModel.count({ where: { visitId: visit.id, endedAt: null } })).toBe(0);
  });
});
