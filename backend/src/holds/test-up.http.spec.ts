import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { VisitModel } from '../visits/visit.model.js';
import { LotUnitModel } from '../lots/lot-unit.model.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { HoldScenario } from './holds.scenario.js';
import { ReadingModel } from './reading.model.js';
import { TestUpModel } from './test-up.model.js';

describe('saying that the test is up, and that it is down again', () => {
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
  });
  afterAll(() => server?.close());

  const upAs = (person: WorldPerson, visit: VisitModel, parts: object = {}) =>
    world
      .as(person)
      .post(`/api/visits/${visit.id}/test-up`, { ...scenario.stamp(), expectedVersion: visit.version, ...parts });
  const downAs = (person: WorldPerson, visit: VisitModel, parts: object = {}) =>
    world
      .as(person)
      .post(`/api/visits/${visit.id}/no-longer-up`, { ...scenario.stamp(), expectedVersion: visit.version, ...parts });
  const eventsOf = async (visitId: string) => {
    const rows = await server.db.query<{ kind: string }>(
      'SELECT kind FROM outbox_events WHERE visit_id = :visitId ORDER BY position',
      {
        replacements: { visitId },
        type: QueryTypes.SELECT,
      },
    );
    return rows.map((row) => row.kind);
  };

  describe('with both systems standing', () => {
    let visit: VisitModel;
    beforeAll(async () => {
      visit = await scenario.visit(world.lots[0]);
      await scenario.standUp(world.lots[0]);
    });

    it('is the plumber’s alone', async () => {
      for (const person of ['superintendent', 'helper', 'plumberOwner', 'inspector', 'desk'] as const) {
        expect((await upAs(person, visit).expect(403)).body.code).toBe('not-allowed');
      }
      for (const person of ['otherPlumber', 'otherInspector', 'operator'] as const)
        await upAs(person, visit).expect(404);
      await visit.reload();
      expect(visit.state).toBe('booked');
    });

    it('makes the visit ready from the moment it was said, on the readings that count, and tells it once', async () => {
      const body = scenario.stamp(20);
      const answer = await upAs('plumber', visit, body).expect(200);
      expect(answer.body).toMatchObject({ state: 'ready', version: 1, upSince: body.madeAt });
      expect(answer.body.systemsUp).toEqual([
        { unitNumber: 1, system: 'dwv', isUp: true },
        { unitNumber: 1, system: 'water', isUp: true },
      ]);
      const again = await upAs('plumber', visit, body).expect(200);
      expect(again.body).toEqual(answer.body);
      const statement = await TestUpModel.findOne({ where: { visitId: visit.id }, rejectOnEmpty: true });
      const readings = await ReadingModel.findAll({ where: { id: statement.readingIds } });
      expect(readings.map((reading) => reading.pressurePsi ?? reading.levelIn).sort()).toEqual([120, 2]);
      expect(await eventsOf(visit.id)).toEqual(['test-up']);
    });

    it('refuses a second statement, and one on another version, with what it is now', async () => {
      const stale = await upAs('plumber', visit).expect(409);
      expect(stale.body).toMatchObject({ code: 'stale-state', params: { is: 'ready', version: 1 } });
      await visit.reload();
      expect((await upAs('plumber', visit).expect(409)).body).toMatchObject({
        code: 'stale-state',
        params: { is: 'ready' },
      });
    });

    it('is taken back by the plumber, or by the inspector of the visit, and by nobody else', async () => {
      for (const person of ['superintendent', 'helper', 'desk', 'builderOwner'] as const) {
        expect((await downAs(person, visit).expect(403)).body.code).toBe('not-allowed');
      }
      expect((await downAs('secondInspector', visit).expect(409)).body.code).toBe('visit-of-another');
      await downAs('otherInspector', visit).expect(404);
      const down = await downAs('inspector', visit, { note: 'gauge at zero' }).expect(200);
      expect(down.body).toMatchObject({ state: 'booked', version: 2, upSince: null });
      expect((await downAs('inspector', visit, { note: 'gauge at zero' }).expect(200)).body).toEqual(down.body);
      const statement = await TestUpModel.findOne({ where: { visitId: visit.id }, rejectOnEmpty: true });
      expect(statement).toMatchObject({ endNote: 'gauge at zero', endedBy: world.people.inspector.id });
      await visit.reload();
      await upAs('plumber', visit).expect(200);
      await visit.reload();
      await downAs('plumber', visit).expect(200);
      await visit.reload();
      expect((await downAs('plumber', visit).expect(409)).body).toMatchObject({
        code: 'stale-state',
        params: { is: 'booked' },
      });
      expect(await eventsOf(visit.id)).toEqual(['test-up', 'no-longer-up', 'test-up', 'no-longer-up']);
    });

    it('ends with a required test that ends under it', async () => {
      await visit.reload();
      await upAs('plumber', visit).expect(200);
      const list = await world.as('plumber').get(`/api/lots/${visit.lotId}/holds`).expect(200);
      const water = (list.body.items as Array<{ id: string; system: string }>).find((hold) => hold.system === 'water');
      await world
        .as('plumber')
        .post(`/api/holds/${water?.id}/end`, { ...scenario.stamp(), reason: 'lost' })
        .expect(200);
      await visit.reload();
      expect(visit.state).toBe('booked');
      const statements = await TestUpModel.findAll({ where: { visitId: visit.id, endedAt: null } });
      expect(statements).toEqual([]);
      expect((await upAs('plumber', visit).expect(409)).body).toMatchObject({
        code: 'reading-missing',
        params: { missing: [{ unitNumber: 1, system: 'water', why: 'no-test' }] },
      });
    });

    it('ends with a test that supersedes the one it rested on', async () => {
      await scenario.start(world.lots[0], scenario.waterBody());
      await upAs('plumber', visit).expect(200);
      await scenario.start(world.lots[0], scenario.waterBody({ isSuperseding: true }));
      await visit.reload();
      expect(visit.state).toBe('booked');
    });
  });

  describe('with something missing', () => {
    let visit: VisitModel;
    beforeAll(async () => {
      await LotUnitModel.create({
        id: randomUUID(),
        lotId: world.lots[1].id,
        number: 2,
        label: 'Flat',
        geometry: null,
      });
      visit = await scenario.visit(world.lots[1], { unitNumbers: [1, 2], inspector: 'secondInspector' });
    });

    it('names every system of every unit, and why', async () => {
      await scenario.start(world.lots[1], scenario.dwvBody());
      await scenario.start(world.lots[1], scenario.waterBody({ firstReading: scenario.pressure(120, 'shut') }));
      await scenario.start(world.lots[1], scenario.waterBody({ unitNumber: 2, firstReading: scenario.pressure(90) }));
      const answer = await upAs('plumber', visit).expect(409);
      expect(answer.body).toMatchObject({
        code: 'reading-missing',
        params: {
          missing: [
            { unitNumber: 1, system: 'water', why: 'no-open-reading' },
            { unitNumber: 2, system: 'dwv', why: 'no-test' },
            { unitNumber: 2, system: 'water', why: 'below-minimum' },
          ],
        },
      });
    });

    it('adds the readings given with it first, and keeps none of them when it is refused', async () => {
      const list = await world.as('plumber').get(`/api/lots/${visit.lotId}/holds`).expect(200);
      const holds = list.body.items as Array<{ id: string; system: string; unitNumber: number }>;
      const idOf = (unitNumber: number) =>
        holds.find((hold) => hold.system === 'water' && hold.unitNumber === unitNumber)?.id;
      const readings = [
        { holdId: idOf(1), ...scenario.pressure(110) },
        { holdId: idOf(2), ...scenario.pressure(105) },
      ];
      expect((await upAs('plumber', visit, { readings }).expect(409)).body.params).toEqual({
        missing: [{ unitNumber: 2, system: 'dwv', why: 'no-test' }],
      });
      expect(await ReadingModel.count({ where: { pressurePsi: 110 } })).toBe(0);
      await scenario.start(world.lots[1], scenario.dwvBody({ unitNumber: 2 }));
      expect((await upAs('plumber', visit, { readings }).expect(200)).body.state).toBe('ready');
      expect(await ReadingModel.count({ where: { clientId: readings.map((each) => each.clientId) } })).toBe(2);
    });
  });

  it('refuses a test that stands over its lowest-rated part', async () => {
    const lot = world.lots[2];
    const visit = await scenario.visit(lot);
    await scenario.standUp(lot);
    const list = await world.as('plumber').get(`/api/lots/${lot.id}/holds`).expect(200);
    const water = (list.body.items as Array<{ id: string; system: string }>).find((hold) => hold.system === 'water');
    const readings = [{ holdId: water?.id, ...scenario.pressure(161) }];
    expect((await upAs('plumber', visit, { readings }).expect(409)).body).toMatchObject({
      code: 'over-limit',
      params: { unitNumber: 1, system: 'water', pressurePsi: 161, ceilingPsi: 160 },
    });
    const elsewhere = [{ holdId: randomUUID(), ...scenario.pressure(120) }];
    expect((await upAs('plumber', visit, { readings: elsewhere }).expect(400)).body.fields).toEqual({
      'readings.0.holdId': 'not-standing-for-this-visit',
    });
  });

  it('has nothing to say up at a stage without a test', async () => {
    const visit = await scenario.visit(world.lots[3], { stageCode: 'final', label: 'noon' });
    expect((await upAs('plumber', visit).expect(409)).body).toMatchObject({
      code: 'move-not-allowed',
      params: { why: 'no-test-at-this-stage' },
    });
  });

  it('keeps the readings of a statement on a visit that changed meanwhile, though nothing is said up', async () => {
    const lot = world.lots[4];
    const { water } = await scenario.standUp(lot);
    const visit = await scenario.visit(lot, { label: 'late' });
    await visit.update({ state: 'withdrawn', version: 1, endedAt: server.clock.now() });
    const elsewhere = { holdId: randomUUID(), ...scenario.pressure(114) };
    const readings = [{ holdId: water.id, ...scenario.pressure(115, 'open', 30) }, elsewhere];
    const answer = await upAs('plumber', visit, { ...scenario.stamp(30), expectedVersion: 0, readings }).expect(409);
    expect(answer.body).toMatchObject({
      code: 'stale-state',
      params: { is: 'withdrawn', version: 1, readingsKept: 1 },
    });
    expect(await ReadingModel.count({ where: { holdId: water.id } })).toBe(2);
    expect(await TestUpModel.count({ where: { visitId: visit.id } })).toBe(0);
  });

  it('lets one of two at the same moment through', async () => {
    const lot = world.lots[5];
    await scenario.standUp(lot);
    const visit = await scenario.visit(lot, { label: 'late', inspector: 'secondInspector' });
    const answers = await Promise.all([upAs('plumber', visit), upAs('plumber', visit)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(answers.find((answer) => answer.status === 409)?.body.code).toBe('stale-state');
    expect(await eventsOf(visit.id)).toEqual(['test-up']);
  });

  it('keeps the version of the rule card a visit was booked under', async () => {
    const kept = await scenario.visit(world.lots[3], { label: 'late', inspector: 'secondInspector' });
    await server.db.query(`UPDATE rule_cards SET effective = daterange('2027-01-01', '2027-03-01') WHERE id = :id`, {
      replacements: { id: kept.ruleCardId },
      type: QueryTypes.UPDATE,
    });
    await scenario.standUp(world.lots[3]);
    expect((await upAs('plumber', kept).expect(200)).body.state).toBe('ready');
    const refused = await world
      .as('plumber')
      .post(`/api/lots/${world.lots[2].id}/holds`, scenario.dwvBody({ stageCode: 'groundwork' }))
      .expect(409);
    expect(refused.body.code).toBe('no-rule-card');
  });
});
