import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LotModel } from '../lots/lot.model.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { addLots, ask, asking, book, nextDay, readVisit, setRuleCard } from '../testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

async function newLot(overrides: Partial<LotModel> = {}): Promise<LotModel> {
  const [lot] = await addLots(server, world, 1);
  return (lot as LotModel).update(overrides);
}

/** A request that waits for the desk, of the first set. */
async function request(label = 'early', date = nextDay): Promise<VisitSummary> {
  await setRuleCard(server, world.ruleCard.id, ruleCardContent({ asking: asking({ booking: 'desk' }) }));
  const answer = await ask(world, [(await newLot()).id], { label, date });
  await setRuleCard(server, world.ruleCard.id, ruleCardContent());
  return answer.body.visits[0];
}

const place = (visit: VisitSummary, body: object = {}, by: WorldPerson = 'desk') =>
  world
    .as(by)
    .post(`/api/visits/${visit.id}/place`, { expectedVersion: visit.version, date: nextDay, label: 'early', ...body });
const move = (visit: VisitSummary, body: object, by: WorldPerson = 'superintendent') =>
  world
    .as(by)
    .post(`/api/visits/${visit.id}/move`, { expectedVersion: visit.version, date: nextDay, label: 'mid', ...body });
const lastEventOf = async (visitId: string) => {
  const events = await server.db.query<{ kind: string; payload: Record<string, unknown> }>(
    'SELECT kind, payload FROM outbox_events WHERE visit_id = :visitId ORDER BY position',
    { replacements: { visitId }, type: QueryTypes.SELECT },
  );
  return { count: events.length, ...events.at(-1) };
};

describe('the desk places a request', () => {
  it('with the first free inspector; the entry begins with SEQUENCE 0', async () => {
    const visit = await request();
    const answer = await place(visit, { date: '2027-03-04', label: 'late' });
    expect(answer.body).toMatchObject({
      state: 'booked',
      version: 1,
      inspector: { name: 'Gil Strand' },
      window: { date: '2027-03-04', label: 'late' },
    });
    expect(await lastEventOf(visit.id)).toMatchObject({
      count: 2,
      kind: 'visit-booked',
      payload: { visit: { calendarSequence: 0 } },
    });
  });

  it('with the inspector it names, where they are free', async () => {
    const inspectorId = world.people.inspector.id;
    expect((await place(await request(), { inspectorId, date: '2027-03-08' })).body.inspector.name).toBe(
      'Noor Haverty',
    );
    const wrong = await place(await request(), { inspectorId: world.people.desk.id });
    expect(wrong.body).toMatchObject({ code: 'bad-input', fields: { inspectorId: 'no-such-inspector' } });
    const foreign = await place(await request(), { inspectorId: world.people.otherInspector.id });
    expect(foreign.body).toMatchObject({ code: 'bad-input', fields: { inspectorId: 'no-such-inspector' } });
  });

  it('today and beyond the horizon too, never in the past nor where there is no window', async () => {
    const visit = await request();
    expect((await place(visit, { date: '2027-03-01' })).body.code).toBe('window-past');
    expect((await place(visit, { label: 'midnight' })).body.code).toBe('window-unknown');
    expect((await place(visit, { date: '2027-03-02', label: 'late' })).status).toBe(200);
    expect((await place(await request(), { date: '2027-05-04' })).status).toBe(200);
  });

  it('is for the desk of that department alone', async () => {
    const visit = await request();
    for (const by of ['superintendent', 'plumber', 'helper', 'inspector', 'departmentOwner', 'builderOwner'] as const) {
      expect((await place(visit, {}, by)).body).toMatchObject({ code: 'not-allowed', params: { move: 'place' } });
    }
    for (const by of ['otherDesk', 'otherSuperintendent', 'operator'] as const)
      expect((await place(visit, {}, by)).body.code).toBe('not-found');
    expect((await world.nobody().post(`/api/visits/${visit.id}/place`, {})).status).toBe(401);
    expect(await readVisit(world, visit.id)).toMatchObject({ state: 'requested', version: 0 });
  });

  it('is told what the visit is when that is something else now', async () => {
    const visit = await request();
    expect((await place(visit, { expectedVersion: 3 })).body).toMatchObject({
      code: 'stale-state',
      params: { is: 'requested', version: 0 },
    });
    await place(visit, { date: '2027-03-09' });
    expect((await place(visit, { expectedVersion: 1, date: '2027-03-09' })).body).toMatchObject({
      code: 'stale-state',
      params: { is: 'booked', version: 1 },
    });
  });

  it('finds no room in a full window, and is told the next ones', async () => {
    for (let n = 0; n < 3; n += 1) await book(world, await newLot(), { date: '2027-03-10', label: 'noon' });
    const answer = await place(await request(), { date: '2027-03-10', label: 'noon' });
    expect(answer.body).toMatchObject({
      code: 'window-full',
      params: { why: 'full', offers: [{ isTakeable: true }, {}, {}] },
    });
  });
});

describe('a visit moves', () => {
  it('keeps its state and its calendar identity; SEQUENCE rises and the mail says from where', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-11' });
    const { calendarUid } = await VisitModel.findByPk(visit.id, { rejectOnEmpty: true });
    const answer = await move(visit, { date: '2027-03-11', label: 'late' });
    expect(answer.body).toMatchObject({ state: 'booked', version: 1, window: { label: 'late' } });
    const row = await VisitModel.findByPk(visit.id, { rejectOnEmpty: true });
    expect(row).toMatchObject({ calendarUid, calendarSequence: 1, windowDate: '2027-03-11', windowLabel: 'late' });
    expect(await lastEventOf(visit.id)).toMatchObject({
      count: 2,
      kind: 'visit-moved',
      payload: {
        isBooked: true,
        from: { startAt: visit.window.startAt, endAt: visit.window.endAt },
        visit: { calendarSequence: 1, startAt: answer.body.window.startAt, formerInspectorId: null },
      },
    });
  });

  it('stays ready when it was', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-11' });
    await VisitModel.update({ state: 'ready', readyAt: server.clock.now() }, { where: { id: visit.id } });
    expect((await move(visit, { date: '2027-03-11', label: 'noon' })).body).toMatchObject({
      state: 'ready',
      upSince: server.clock.now().toISOString(),
    });
  });

  it('a request changes its wish only, and nobody’s calendar', async () => {
    const visit = await request();
    const answer = await move(visit, { date: '2027-03-15', label: 'late' });
    expect(answer.body).toMatchObject({
      state: 'requested',
      version: 1,
      inspector: null,
      window: { date: '2027-03-15', label: 'late' },
    });
    expect(await lastEventOf(visit.id)).toMatchObject({
      kind: 'visit-moved',
      payload: { isBooked: false, visit: { calendarSequence: 0 } },
    });
  });

  it('to another inspector by the desk; the one before is told', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-15' });
    const body = { date: '2027-03-15', label: 'early', inspectorId: world.people.inspector.id };
    const answer = await move(visit, body, 'desk');
    expect(answer.body).toMatchObject({ inspector: { name: 'Noor Haverty' }, version: 1 });
    expect(await lastEventOf(visit.id)).toMatchObject({
      payload: { visit: { formerInspectorId: world.people.secondInspector.id, calendarSequence: 0 } },
    });
    expect((await move(answer.body, { ...body, label: 'mid' })).body).toMatchObject({
      code: 'bad-input',
      fields: { inspectorId: 'desk-places' },
    });
  });

  it('stays with its inspector where that can be', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-15', label: 'noon' });
    const moved = await move(
      visit,
      { date: '2027-03-15', label: 'noon', inspectorId: world.people.inspector.id },
      'desk',
    );
    expect((await move(moved.body, { date: '2027-03-15', label: 'late' })).body.inspector.name).toBe('Noor Haverty');
  });

  it('nowhere when it is there already', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-16' });
    expect((await move(visit, { date: '2027-03-16', label: 'early' })).body).toMatchObject({
      code: 'bad-input',
      fields: { label: 'same-window' },
    });
  });

  it('by the rules of asking for the requesting side, freely for the desk', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-16' });
    expect((await move(visit, { date: '2027-03-02', label: 'late' })).body.code).toBe('cut-off-passed');
    expect((await move(visit, { date: '2027-05-04' })).body.code).toBe('beyond-horizon');
    expect((await move(visit, { date: '2027-03-02', label: 'late' }, 'desk')).status).toBe(200);
  });

  it('by the plumber where the lot lets them', async () => {
    const visit = await book(world, await newLot({ mayPlumberRequest: false }), { date: '2027-03-16', label: 'mid' });
    expect((await move(visit, { date: '2027-03-16', label: 'noon' }, 'plumber')).body.code).toBe('not-allowed');
    await LotModel.update({ mayPlumberRequest: true }, { where: { id: visit.lotId } });
    expect((await move(visit, { date: '2027-03-16', label: 'noon' }, 'plumber')).status).toBe(200);
    for (const by of ['helper', 'inspector', 'builderOwner'] as const)
      expect((await move(visit, {}, by)).body.code).toBe('not-allowed');
    for (const by of ['otherSuperintendent', 'otherDesk'] as const)
      expect((await move(visit, {}, by)).body.code).toBe('not-found');
  });

  it('not once it is underway or over', async () => {
    const visit = await book(world, await newLot(), { date: '2027-03-17' });
    await VisitModel.update(
      { state: 'underway', begunAt: new Date(testNow), begunFrom: 'booked' },
      { where: { id: visit.id } },
    );
    expect((await move(visit, {})).body).toMatchObject({ code: 'stale-state', params: { is: 'underway' } });
    await VisitModel.update({ state: 'closed', endedAt: server.clock.now() }, { where: { id: visit.id } });
    expect((await move(visit, {}, 'desk')).body).toMatchObject({ code: 'stale-state', params: { is: 'closed' } });
  });
});
