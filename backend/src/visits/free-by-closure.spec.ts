import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { LotModel } from '../lots/lot.model.js';
import { addLots, ask, book, readVisit } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

const newVisit = async (date: string, label: string): Promise<VisitSummary> => {
  const [lot] = await addLots(server, world, 1);
  return book(world, lot as LotModel, { date, label });
};
const close = (date: string, from: string | null = null, to: string | null = null) =>
  world
    .as('desk')
    .post(`/api/departments/${world.organizations.department.id}/closures`, { date, from, to, why: 'Snow' });
const stateOf = async ({ id }: VisitSummary) => (await readVisit(world, id)).state;

describe('a closure', () => {
  it('of a day frees every booked and ready visit of it, told with the department’s words', async () => {
    const [early, late, other] = [
      await newVisit('2027-03-04', 'early'),
      await newVisit('2027-03-04', 'late'),
      await newVisit('2027-03-08', 'early'),
    ];
    await VisitModel.update({ state: 'ready', readyAt: server.clock.now() }, { where: { id: late.id } });
    expect((await close('2027-03-04')).status).toBe(201);
    expect(await Promise.all([early, late, other].map(stateOf))).toEqual(['freed', 'freed', 'booked']);
    expect(await readVisit(world, early.id)).toMatchObject({ endReason: 'Snow' });
    const events = await server.db.query<{ payload: object; actor_id: string }>(
      `SELECT payload, actor_id FROM outbox_events WHERE kind = 'visit-freed' AND visit_id = :id`,
      { replacements: { id: early.id }, type: QueryTypes.SELECT },
    );
    expect(events).toMatchObject([
      { actor_id: world.people.desk.id, payload: { reason: 'Snow', visit: { calendarSequence: 1 } } },
    ]);
  });

  it('of part of a day frees the windows it touches and no others', async () => {
    const [early, mid, noon] = [
      await newVisit('2027-03-09', 'early'),
      await newVisit('2027-03-09', 'mid'),
      await newVisit('2027-03-09', 'noon'),
    ];
    expect((await close('2027-03-09', '09:00', '10:00')).status).toBe(201);
    expect(await Promise.all([early, mid, noon].map(stateOf))).toEqual(['booked', 'freed', 'booked']);
  });

  it('leaves a visit underway and a request to people', async () => {
    const begun = await newVisit('2027-03-10', 'early');
    const now = server.clock.now();
    await VisitModel.update(
      { state: 'underway', begunAt: now, begunBy: world.people.inspector.id, begunFrom: 'ready' },
      { where: { id: begun.id } },
    );
    const waiting = await newVisit('2027-03-10', 'mid');
    await VisitModel.update(
      { state: 'requested', place: null, inspectorId: null, planned: null },
      { where: { id: waiting.id } },
    );
    expect((await close('2027-03-10')).status).toBe(201);
    expect(await Promise.all([begun, waiting].map(stateOf))).toEqual(['underway', 'requested']);
  });

  it('and bookings into the same day at once leave nothing booked inside it', async () => {
    const lots = await addLots(server, world, 6);
    const asks = lots.map((lot, index) =>
      ask(world, [lot.id], { date: '2027-03-11', label: index % 2 === 0 ? 'early' : 'late' }),
    );
    const [closed, ...answers] = await Promise.all([close('2027-03-11'), ...asks]);
    expect(closed.status).toBe(201);
    for (const { status, body } of answers) {
      if (status !== 201) expect(body.code).toBe('window-closed');
    }
    expect(await VisitModel.count({ where: { windowDate: '2027-03-11', state: ['booked', 'ready'] } })).toBe(0);
  });
});
