import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { join } from '../testing/fixtures/world.people.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import type { VisitModel } from '../visits/visit.model.js';
import { HoldScenario } from '../holds/holds.scenario.js';

describe('beginning a visit', () => {
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
  });
  afterAll(() => server?.close());

  const beginAs = (person: WorldPerson, visit: VisitModel, parts: object = {}) =>
    world
      .as(person)
      .post(`/api/visits/${visit.id}/begin`, { ...scenario.stamp(), expectedVersion: visit.version, ...parts });
  const undoAs = (person: WorldPerson, visit: VisitModel) =>
    world.as(person).post(`/api/visits/${visit.id}/undo-begin`, { expectedVersion: visit.version });
  const eventsOf = (visitId: string) =>
    server.db.query<{ kind: string; payload: { visit: { formerInspectorId?: string | null } } }>(
      'SELECT kind, payload FROM outbox_events WHERE visit_id = :visitId ORDER BY position',
      { replacements: { visitId }, type: QueryTypes.SELECT },
    );

  it('is for an inspector of the department, whatever else others may do', async () => {
    const visit = await scenario.visit(world.lots[0]);
    for (const person of ['superintendent', 'builderOwner', 'plumber', 'helper', 'desk', 'departmentOwner'] as const) {
      expect((await beginAs(person, visit).expect(403)).body.code).toBe('not-allowed');
      expect((await undoAs(person, visit).expect(403)).body.code).toBe('not-allowed');
    }
    for (const person of ['otherInspector', 'otherPlumber', 'operator'] as const)
      await beginAs(person, visit).expect(404);
    await world.nobody().post(`/api/visits/${visit.id}/begin`, {}).expect(401);
  });

  it('starts once; sent twice it is the same start, and a second one meets what it is now', async () => {
    const visit = await scenario.visit(world.lots[1]);
    const body = scenario.stamp(3);
    const begun = await beginAs('inspector', visit, body).expect(200);
    expect(begun.body).toMatchObject({ state: 'underway', version: 1 });
    expect((await beginAs('inspector', visit, body).expect(200)).body).toEqual(begun.body);
    const events = await eventsOf(visit.id);
    expect(events.map((event) => event.kind)).toEqual(['visit-underway']);
    await visit.reload();
    expect(visit).toMatchObject({
      begunFrom: 'booked',
      begunBy: world.people.inspector.id,
      begunAt: new Date(body.madeAt),
    });
    expect((await beginAs('inspector', visit).expect(409)).body).toMatchObject({
      code: 'stale-state',
      params: { is: 'underway', version: 1 },
    });
  });

  it('waits for the window unless the test is up', async () => {
    const early = await scenario.visit(world.lots[2], { label: 'noon' });
    const refused = await beginAs('inspector', early).expect(409);
    expect(refused.body).toMatchObject({ code: 'window-not-open', params: { opensAt: '2027-03-02T18:00:00.000Z' } });
    const ready = await scenario.visit(world.lots[3], { label: 'noon', state: 'ready' });
    expect((await beginAs('inspector', ready).expect(200)).body.state).toBe('underway');
    server.clock.set('2027-03-02T18:00:00Z');
    expect((await beginAs('inspector', early).expect(200)).body.state).toBe('underway');
    server.clock.set(testNow);
  });

  it('goes by when it was made, not by when it was sent', async () => {
    const visit = await scenario.visit(world.lots[4], { label: 'noon' });
    server.clock.set('2027-03-02T18:05:00Z');
    expect((await beginAs('inspector', visit, scenario.stamp(6)).expect(409)).body.code).toBe('window-not-open');
    server.clock.set(testNow);
  });

  describe('of another', () => {
    it('is taken over only knowingly, and then stands in the new name', async () => {
      const visit = await scenario.visit(world.lots[5], {
        label: 'late',
        state: 'ready',
        plannedAt: '2027-03-02T20:30:00Z',
      });
      const refused = await beginAs('secondInspector', visit).expect(409);
      expect(refused.body).toMatchObject({ code: 'visit-of-another', params: { inspectorName: 'Noor Haverty' } });
      const taken = await beginAs('secondInspector', visit, { isTakingOver: true }).expect(200);
      expect(taken.body).toMatchObject({
        state: 'underway',
        inspector: { name: 'Gil Strand' },
        plannedStartAt: '2027-03-02T20:30:00.000Z',
      });
      const [event] = await eventsOf(visit.id);
      expect(event?.payload.visit.formerInspectorId).toBe(world.people.inspector.id);
      await visit.reload();
      expect((await undoAs('inspector', visit).expect(409)).body.code).toBe('visit-of-another');
    });

    it('is refused where the planned spans would overlap, and stays as it was', async () => {
      await scenario.visit(world.lots[0], {
        label: 'early',
        stageCode: 'groundwork',
        inspector: 'secondInspector',
        plannedAt: '2027-03-02T14:30:00Z',
      });
      const visit = await scenario.visit(world.lots[1], {
        label: 'early',
        stageCode: 'groundwork',
        plannedAt: '2027-03-02T14:45:00Z',
      });
      const refused = await beginAs('secondInspector', visit, { isTakingOver: true }).expect(409);
      expect(refused.body).toMatchObject({ code: 'visit-of-another', params: { why: 'own-visit-at-that-time' } });
      await visit.reload();
      expect(visit).toMatchObject({ state: 'booked', version: 0, inspectorId: world.people.inspector.id });
    });

    it('is never taken over by one who belongs to the builder or the plumber', async () => {
      await join(world.people.secondInspector, world.organizations.plumber, ['helper'], server.clock.now());
      const visit = await scenario.visit(world.lots[2], { label: 'early', stageCode: 'groundwork' });
      expect((await beginAs('secondInspector', visit, { isTakingOver: true }).expect(403)).body.code).toBe(
        'not-allowed',
      );
    });
  });

  describe('taken back', () => {
    it.each(['booked', 'ready'] as const)('within a minute it is %s again', async (state) => {
      const lot = world.lots[state === 'booked' ? 3 : 4];
      const visit = await scenario.visit(lot, { stageCode: 'groundwork', state });
      await beginAs('inspector', visit).expect(200);
      await visit.reload();
      server.clock.advance(1);
      const undone = await undoAs('inspector', visit).expect(200);
      server.clock.set(testNow);
      expect(undone.body).toMatchObject({ state, version: 2 });
      await visit.reload();
      expect(visit).toMatchObject({ begunAt: null, begunBy: null, begunFrom: null });
      expect((await undoAs('inspector', visit).expect(409)).body).toMatchObject({
        code: 'stale-state',
        params: { is: state },
      });
    });

    it('after a minute it is too late', async () => {
      const visit = await scenario.visit(world.lots[5], { label: 'late', stageCode: 'groundwork', state: 'underway' });
      server.clock.set(new Date(Date.parse(testNow) + 60_001));
      const refused = await undoAs('inspector', visit).expect(409);
      server.clock.set(testNow);
      expect(refused.body).toMatchObject({ code: 'undo-too-late', params: { seconds: 60 } });
    });
  });
});
