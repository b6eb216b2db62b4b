import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { LotUnitModel } from '../lots/lot-unit.model.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { HoldModel } from './hold.model.js';
import { HoldScenario } from './holds.scenario.js';
import { ReadingModel } from './reading.model.js';

describe('tests over the API', () => {
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
  });
  afterAll(() => server?.close());

  const lot = (index: 0 | 1 | 2 | 3 | 4 | 5) => world.lots[index];
  const startAs = (person: WorldPerson, index: 0 | 1 | 2 | 3 | 4 | 5, body: object) =>
    world.as(person).post(`/api/lots/${lot(index).id}/holds`, body);
  const kindsOf = async (lotId: string) => {
    const rows = await server.db.query<{ kind: string }>(
      'SELECT kind FROM ledger_entries WHERE lot_id = :lotId ORDER BY sequence',
      {
        replacements: { lotId },
        type: QueryTypes.SELECT,
      },
    );
    return rows.map((row) => row.kind);
  };

  describe('starting one', () => {
    it('copies the terms of the rule card, keeps the first reading and tells the ledger', async () => {
      const body = scenario.waterBody();
      const hold = await scenario.start(lot(0), body);
      expect(hold).toMatchObject({ ordinal: 1, minimumPsi: 100, ceilingPsi: 160, settleMinutes: 0, state: 'standing' });
      expect(hold.readings).toEqual([
        expect.objectContaining({
          pressurePsi: 120,
          gaugeValve: 'open',
          byName: 'Ruben Achterberg',
          byRole: 'plumber',
          isStruck: false,
        }),
      ]);
      expect(await kindsOf(lot(0).id)).toEqual(['test-started', 'reading-added', 'plumbing-state']);
      const list = await world
        .as('inspector')
        .get(`/api/lots/${lot(0).id}/holds`)
        .expect(200);
      expect(list.body).toEqual({ items: [hold] });
    });

    it('gives the same test again for the same client id, and refuses the id on another lot', async () => {
      const body = scenario.dwvBody();
      const first = await scenario.start(lot(0), body);
      const again = await scenario.start(lot(0), body);
      expect(again).toEqual(first);
      const elsewhere = await startAs('plumber', 1, body).expect(400);
      expect(elsewhere.body).toMatchObject({ code: 'bad-input', fields: { clientId: 'used-before' } });
      expect(await HoldModel.count({ where: { lotId: lot(0).id } })).toBe(2);
    });

    it('lets one stand of a unit, stage and system; another supersedes it only when asked for', async () => {
      const first = await scenario.start(lot(1), scenario.waterBody());
      const refused = await startAs('plumber', 1, scenario.waterBody()).expect(409);
      expect(refused.body).toMatchObject({ code: 'hold-standing', params: { holdId: first.id, ordinal: 1 } });
      const second = await scenario.start(lot(1), scenario.waterBody({ isSuperseding: true }));
      expect(second.ordinal).toBe(2);
      const rows = await HoldModel.findAll({ where: { lotId: lot(1).id }, order: [['ordinal', 'ASC']] });
      expect(rows.map((row) => [row.state, row.endReason, row.supersedesId])).toEqual([
        ['ended', 'superseded', null],
        ['standing', null, first.id],
      ]);
    });

    it('lets one of several at the same moment stand', async () => {
      const bodies = Array.from({ length: 5 }, () => scenario.dwvBody());
      const answers = await Promise.all(bodies.map((body) => startAs('plumber', 2, body)));
      expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409, 409, 409]);
      expect(
        answers.filter((answer) => answer.status === 409).every((answer) => answer.body.code === 'hold-standing'),
      ).toBe(true);
    });

    it('sees the units of one lot apart', async () => {
      await LotUnitModel.create({ id: randomUUID(), lotId: lot(2).id, number: 2, label: 'Flat', geometry: null });
      expect((await scenario.start(lot(2), scenario.dwvBody({ unitNumber: 2 }))).ordinal).toBe(1);
    });

    it.each([
      [
        'a method the card does not accept',
        { method: 'sectional' },
        409,
        { code: 'method-not-accepted', fields: { method: 'method-not-accepted' } },
      ],
      ['a stage the card does not name', { stageCode: 'attic' }, 400, { code: 'stage-unknown' }],
      [
        'a unit the lot does not have',
        { unitNumber: 9 },
        400,
        { code: 'bad-input', fields: { unitNumber: 'no-such-unit' } },
      ],
      ['no tape', { tape: null }, 400, { code: 'bad-input', fields: { tape: 'required' } }],
    ])('refuses %s', async (_what, overrides, status, body) => {
      const answer = await startAs('plumber', 3, { ...scenario.dwvBody(), ...overrides }).expect(status);
      expect(answer.body).toMatchObject(body);
    });

    it('writes nothing when the first reading does not fit', async () => {
      const body = scenario.waterBody({ firstReading: scenario.pressure(201) });
      const answer = await startAs('plumber', 3, body).expect(400);
      expect(answer.body).toMatchObject({
        code: 'reading-out-of-gauge',
        fields: { 'firstReading.pressurePsi': 'above-gauge-range' },
      });
      const future = scenario.waterBody({ firstReading: scenario.pressure(120, 'open', -10) });
      expect((await startAs('plumber', 3, future).expect(400)).body.code).toBe('reading-in-the-future');
      expect(await HoldModel.count({ where: { lotId: lot(3).id } })).toBe(0);
      expect(await kindsOf(lot(3).id)).toEqual([]);
    });

    it('is the plumber’s alone; a lot of others is not there', async () => {
      for (const person of ['superintendent', 'helper', 'plumberOwner', 'builderOwner', 'inspector', 'desk'] as const) {
        expect((await startAs(person, 3, scenario.dwvBody()).expect(403)).body.code).toBe('not-allowed');
      }
      for (const person of ['otherPlumber', 'otherSuperintendent', 'otherInspector', 'operator'] as const) {
        await startAs(person, 3, scenario.dwvBody()).expect(404);
        await world
          .as(person)
          .get(`/api/lots/${lot(3).id}/holds`)
          .expect(404);
      }
      await world
        .nobody()
        .post(`/api/lots/${lot(3).id}/holds`, scenario.dwvBody())
        .expect(401);
    });

    it('needs a department with a rule card in force', async () => {
      await lot(5).update({ departmentId: null });
      expect((await startAs('plumber', 5, scenario.dwvBody()).expect(409)).body.code).toBe('lot-without-department');
      await lot(5).update({ departmentId: world.organizations.department.id });
    });
  });

  describe('its readings', () => {
    let hold: Hold;
    beforeAll(async () => {
      hold = await scenario.start(lot(4), scenario.waterBody({ firstReading: scenario.pressure(120, 'open', 60) }));
    });
    const addAs = (person: WorldPerson, body: object) => world.as(person).post(`/api/holds/${hold.id}/readings`, body);

    it('come from plumber, helper, superintendent and inspector, each marked', async () => {
      for (const person of ['plumber', 'helper', 'superintendent', 'inspector'] as const) {
        await addAs(person, scenario.pressure(119)).expect(201);
      }
      const roles = await ReadingModel.findAll({
        where: { holdId: hold.id, pressurePsi: 119 },
        order: [['receivedAt', 'ASC']],
      });
      expect(roles.map((row) => row.byRole).sort()).toEqual(['helper', 'inspector', 'plumber', 'superintendent']);
    });

    it('come from nobody else', async () => {
      for (const person of ['desk', 'plumberOwner', 'builderOwner', 'departmentOwner'] as const) {
        expect((await addAs(person, scenario.pressure(119)).expect(403)).body.code).toBe('not-allowed');
      }
      for (const person of ['otherPlumber', 'otherInspector'] as const)
        await addAs(person, scenario.pressure(119)).expect(404);
    });

    it('stand in the order they were made, the late ones among the others; a repeat is the same one', async () => {
      const late = scenario.pressure(118, 'shut', 30);
      const once = await addAs('helper', late).expect(201);
      const twice = await addAs('helper', late).expect(201);
      expect(twice.body).toEqual(once.body);
      const readings = (once.body as Hold).readings;
      expect(readings.map((reading) => reading.at)).toEqual(readings.map((reading) => reading.at).sort());
      expect(readings[1]).toMatchObject({ pressurePsi: 118, gaugeValve: 'shut', byName: 'Jory Tamsin' });
      expect(Date.parse(readings[1]?.receivedAt ?? '') - server.clock.now().getTime()).toBeLessThan(1000);
    });

    it('are corrected by the clock of the phone that sent them', async () => {
      // a phone ten minutes behind; the header is read against the real clock of this machine
      const madeAt = new Date(server.clock.now().getTime() - 15 * 60_000).toISOString();
      const body = { clientId: randomUUID(), madeAt, pressurePsi: 117, gaugeValve: 'open' };
      const headers = { 'X-Sent-At': new Date(Date.now() - 10 * 60_000).toISOString() };
      await world.as('plumber').post(`/api/holds/${hold.id}/readings`, body, { headers }).expect(201);
      const row = await ReadingModel.findOne({ where: { clientId: body.clientId }, rejectOnEmpty: true });
      const minutesAgo = (server.clock.now().getTime() - row.madeAt.getTime()) / 60_000;
      expect(minutesAgo).toBeGreaterThan(4.9);
      expect(minutesAgo).toBeLessThan(5.1);
    });

    it('fit the gauge', async () => {
      expect((await addAs('plumber', scenario.pressure(200.1)).expect(400)).body).toMatchObject({
        code: 'reading-out-of-gauge',
        params: { rangePsi: 200 },
        fields: { pressurePsi: 'above-gauge-range' },
      });
      expect((await addAs('plumber', scenario.level(3)).expect(400)).body).toMatchObject({
        code: 'bad-input',
        fields: { pressurePsi: 'required', gaugeValve: 'required', levelIn: 'not-for-a-gauge' },
      });
      const other = await scenario.start(lot(4), scenario.dwvBody());
      const body = { ...scenario.pressure(1), clientId: other.readings[0]?.id };
      await addAs('plumber', body).expect(201);
    });

    it('made at one moment stand in the order they came', async () => {
      const madeAt = scenario.stamp(1).madeAt;
      for (const psi of [71, 73, 72]) await addAs('plumber', { ...scenario.pressure(psi), madeAt }).expect(201);
      const list = await world
        .as('plumber')
        .get(`/api/lots/${lot(4).id}/holds`)
        .expect(200);
      const water = (list.body.items as Hold[]).find((each) => each.id === hold.id);
      const pressures = water?.readings
        .map((reading) => reading.pressurePsi)
        .filter((psi) => psi !== null && psi > 70 && psi < 74);
      expect(pressures).toEqual([71, 73, 72]);
    });

    it('of an inspector or a superintendent are struck by nobody of the crew, those of the crew by any of it', async () => {
      for (const person of ['inspector', 'superintendent', 'helper'] as const) {
        const body = scenario.pressure(56);
        const added = await addAs(person, body).expect(201);
        const reading = (added.body as Hold).readings.find((each) => each.byRole === person && each.pressurePsi === 56);
        const strikeAs = (who: WorldPerson) =>
          world.as(who).post(`/api/readings/${reading?.id}/strike`, { why: 'misread' });
        if (person === 'helper') {
          for (const who of ['superintendent', 'inspector'] as const) await strikeAs(who).expect(403);
          await strikeAs('plumber').expect(200);
        } else {
          for (const who of ['plumber', 'helper'] as const) await strikeAs(who).expect(403);
          await strikeAs(person).expect(200);
        }
      }
    });

    it('are struck once with a reason by whoever made them, and kept', async () => {
      const added = await addAs('superintendent', scenario.pressure(55)).expect(201);
      const reading = (added.body as Hold).readings.find((each) => each.pressurePsi === 55);
      const strikeAs = (person: WorldPerson, why = 'misread') =>
        world.as(person).post(`/api/readings/${reading?.id}/strike`, { why });
      for (const person of ['plumber', 'helper', 'inspector', 'desk', 'builderOwner'] as const) {
        expect((await strikeAs(person).expect(403)).body.code).toBe('not-allowed');
      }
      for (const person of ['otherPlumber', 'otherSuperintendent'] as const) await strikeAs(person).expect(404);
      const struck = await strikeAs('superintendent').expect(200);
      expect((struck.body as Hold).readings.find((each) => each.id === reading?.id)).toMatchObject({
        pressurePsi: 55,
        isStruck: true,
        struckWhy: 'misread',
      });
      expect((await strikeAs('superintendent').expect(409)).body).toMatchObject({
        code: 'reading-struck',
        params: { why: 'misread' },
      });
      expect((await strikeAs('superintendent', ' ').expect(400)).body.fields).toEqual({ why: 'required' });
      await world.as('plumber').post(`/api/readings/${randomUUID()}/strike`, { why: 'none' }).expect(404);
    });

    it('cannot be edited or removed in the database itself', async () => {
      const where = { replacements: { id: hold.readings[0]?.id }, type: QueryTypes.UPDATE } as const;
      await expect(server.db.query('UPDATE readings SET pressure_psi = 1 WHERE id = :id', where)).rejects.toThrow(
        /never edited/,
      );
      await expect(server.db.query('DELETE FROM readings WHERE id = :id', where)).rejects.toThrow(/permission denied/);
    });
  });

  describe('ending one', () => {
    let hold: Hold;
    beforeAll(async () => {
      hold = await scenario.start(
        lot(5),
        scenario.waterBody({ ...scenario.stamp(90), firstReading: scenario.pressure(120, 'open', 90) }),
      );
    });
    const endAs = (person: WorldPerson, body: object) => world.as(person).post(`/api/holds/${hold.id}/end`, body);

    it('is the plumber’s alone, with its reason', async () => {
      const body = { ...scenario.stamp(30), reason: 'lost', note: 'gauge knocked off' };
      for (const person of ['helper', 'superintendent', 'inspector', 'desk'] as const) {
        expect((await endAs(person, body).expect(403)).body.code).toBe('not-allowed');
      }
      await endAs('otherPlumber', body).expect(404);
      await endAs('plumber', { ...body, reason: 'superseded' }).expect(400);
      const ended = await endAs('plumber', body).expect(200);
      expect(ended.body).toMatchObject({ state: 'ended', endReason: 'lost', endedAt: body.madeAt });
      expect((await endAs('plumber', body).expect(200)).body).toEqual(ended.body);
      const taken = await endAs('plumber', { ...scenario.stamp(), reason: 'taken-down' }).expect(409);
      expect(taken.body).toMatchObject({ code: 'hold-ended', params: { endReason: 'lost' } });
      expect((await kindsOf(lot(5).id)).filter((kind) => kind === 'test-ended')).toHaveLength(1);
    });

    it('still takes a reading that was made while it stood, and none made after', async () => {
      const late = await world
        .as('helper')
        .post(`/api/holds/${hold.id}/readings`, scenario.pressure(111, 'open', 45))
        .expect(201);
      expect((late.body as Hold).readings.map((reading) => reading.pressurePsi)).toEqual([120, 111]);
      const after = await world.as('helper').post(`/api/holds/${hold.id}/readings`, scenario.pressure(111)).expect(409);
      expect(after.body).toMatchObject({ code: 'hold-ended', params: { endReason: 'lost' } });
    });

    it('leaves room for the next, which counts on', async () => {
      expect((await scenario.start(lot(5), scenario.waterBody())).ordinal).toBe(2);
      const list = await world
        .as('desk')
        .get(`/api/lots/${lot(5).id}/holds`)
        .expect(200);
      expect((list.body.items as Hold[]).map((each) => each.ordinal)).toEqual([2, 1]);
    });
  });

  it('shows the plumbing under test while one stands, and not tested after', async () => {
    const [row] = await server.db.query<{ state: string }>(
      `SELECT state FROM clearances WHERE lot_id = :lotId AND unit_number = 1 AND stage_code = 'rough-in'`,
      { replacements: { lotId: lot(0).id }, type: QueryTypes.SELECT },
    );
    expect(row?.state).toBe('under-test');
  });
});
