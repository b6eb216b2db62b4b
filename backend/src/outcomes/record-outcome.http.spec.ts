import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { HoldScenario } from '../holds/holds.scenario.js';
import { ReadingModel } from '../holds/reading.model.js';
import { LotUnitModel } from '../lots/lot-unit.model.js';
import { join } from '../testing/fixtures/world.people.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import type { VisitModel } from '../visits/visit.model.js';
import { CorrectionModel } from './correction.model.js';
import { OutcomeModel } from './outcome.model.js';
import { correctionBody, failedDrain, outcomeBody, type OutcomeBody, seenResult } from './outcomes.scenario.js';

describe('recording an outcome', () => {
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
  });
  afterAll(() => server?.close());

  const recordAs = (
    person: WorldPerson,
    visit: VisitModel,
    result: OutcomeBody['result'],
    parts: Partial<OutcomeBody> = {},
  ) =>
    world
      .as(person)
      .post(`/api/visits/${visit.id}/outcome`, { ...outcomeBody(scenario, visit.version, result), ...parts });
  const select = <Row extends object>(sql: string, replacements: Record<string, unknown>) =>
    server.db.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  const eventsOf = async (visitId: string) => {
    const sql = 'SELECT kind FROM outbox_events WHERE visit_id = :visitId ORDER BY position';
    return (await select<{ kind: string }>(sql, { visitId })).map((row) => row.kind);
  };
  const plumbingOf = async (lotId: string, unitNumber = 1) => {
    const sql = `SELECT state FROM clearances WHERE lot_id = :lotId AND unit_number = :unitNumber AND stage_code = 'rough-in'`;
    return (await select<{ state: string }>(sql, { lotId, unitNumber }))[0]?.state;
  };

  describe('that passes', () => {
    it('closes the visit with its systems and every point of the work, tells it once, and clears the plumbing', async () => {
      const lot = world.lots[0];
      await scenario.standUp(lot);
      const visit = await scenario.visit(lot, { state: 'underway' });
      const result = seenResult({
        systems: [
          { unitNumber: 1, system: 'dwv', answer: 'pass', levelIn: 2 },
          { unitNumber: 1, system: 'water', answer: 'pass', needle: 'fell', pressurePsi: 118, note: 'steady' },
        ],
      });
      const body = outcomeBody(scenario, 0, result);
      const answer = await world.as('inspector').post(`/api/visits/${visit.id}/outcome`, body).expect(200);
      expect(answer.body.visit).toMatchObject({
        state: 'closed',
        version: 1,
        outcome: { kind: 'pass', reason: null },
        moves: [],
      });
      expect(answer.body.outcome).toMatchObject({
        kind: 'pass',
        reason: null,
        byName: 'Noor Haverty',
        at: body.madeAt,
      });
      expect(answer.body.outcome.systems).toEqual([
        { unitNumber: 1, system: 'dwv', answer: 'pass', needle: null, pressurePsi: null, levelIn: 2, note: null },
        {
          unitNumber: 1,
          system: 'water',
          answer: 'pass',
          needle: 'fell',
          pressurePsi: 118,
          levelIn: null,
          note: 'steady',
        },
      ]);
      expect(
        answer.body.outcome.work.map((each: { pointCode: string; isLookedAt: boolean }) => [
          each.pointCode,
          each.isLookedAt,
        ]),
      ).toEqual([
        ['nail-plates', true],
        ['supports', true],
      ]);
      expect(answer.body.corrections).toEqual([]);
      expect(await eventsOf(visit.id)).toEqual(['outcome']);
      expect(await plumbingOf(lot.id)).toBe('clear');
      const again = await world.as('inspector').post(`/api/visits/${visit.id}/outcome`, body).expect(200);
      expect(again.body).toEqual(answer.body);
      expect(await OutcomeModel.count({ where: { visitId: visit.id } })).toBe(1);
      const byInspector = await ReadingModel.findAll({
        where: { byRole: 'inspector' },
        order: [['receivedAt', 'ASC']],
      });
      expect(byInspector.map((each) => [each.pressurePsi, each.levelIn, each.gaugeValve])).toEqual([
        [null, 2, null],
        [118, null, 'open'],
      ]);
    });

    it('is read by everyone who may read the lot, and by nobody else', async () => {
      const visit = await OutcomeModel.findOne({ rejectOnEmpty: true });
      for (const person of ['superintendent', 'builderOwner', 'plumber', 'helper', 'inspector', 'desk'] as const) {
        const answer = await world.as(person).get(`/api/visits/${visit.visitId}/outcome`).expect(200);
        expect(answer.body.kind).toBe('pass');
      }
      for (const person of ['otherSuperintendent', 'otherPlumber', 'otherInspector', 'operator'] as const) {
        await world.as(person).get(`/api/visits/${visit.visitId}/outcome`).expect(404);
      }
      const open = await scenario.visit(world.lots[1], { stageCode: 'groundwork' });
      await world.as('inspector').get(`/api/visits/${open.id}/outcome`).expect(404);
    });

    it('leaves a point nobody looked at open, so that the plumbing is not clear', async () => {
      const lot = world.lots[1];
      const visit = await scenario.visit(lot, { state: 'underway' });
      const answer = await recordAs('inspector', visit, seenResult({ lookedAt: ['supports'] })).expect(200);
      expect(answer.body.outcome.work).toMatchObject([{ isLookedAt: false }, { isLookedAt: true }]);
      expect(await plumbingOf(lot.id)).not.toBe('clear');
    });
  });

  describe('that fails', () => {
    let visit: VisitModel;
    beforeAll(async () => {
      visit = await scenario.visit(world.lots[2], { state: 'underway' });
    });

    it('is refused for what does not fit, and writes nothing', async () => {
      const bad = failedDrain({ pointCode: 'no-such-point' });
      expect((await recordAs('inspector', visit, bad).expect(400)).body).toMatchObject({
        code: 'bad-input',
        fields: { 'result.corrections.0.pointCode': 'unknown-point' },
      });
      const bare = { ...failedDrain(), corrections: [] };
      expect((await recordAs('inspector', visit, bare).expect(400)).body.code).toBe('fail-needs-a-correction');
      const unanswered = seenResult({ systems: [{ unitNumber: 1, system: 'water', answer: 'pass' }] });
      expect((await recordAs('inspector', visit, unanswered).expect(400)).body).toMatchObject({
        code: 'answers-missing',
        fields: { 'result.systems.1.dwv': 'required' },
      });
      const passed = seenResult({ corrections: [correctionBody()] });
      expect((await recordAs('inspector', visit, passed).expect(400)).body.code).toBe('pass-with-open-correction');
      expect(await OutcomeModel.count({ where: { visitId: visit.id } })).toBe(0);
      expect(await CorrectionModel.count({ where: { lotId: visit.lotId } })).toBe(0);
      await visit.reload();
      expect(visit).toMatchObject({ state: 'underway', version: 0 });
    });

    it('opens its corrections, counted per lot, each told once', async () => {
      const result = failedDrain();
      result.corrections.push(
        correctionBody({ subject: 'work', pointCode: 'nail-plates', place: 'whole-system', severity: 'note' }),
      );
      const answer = await recordAs('inspector', visit, result, { note: 'come again' }).expect(200);
      expect(answer.body.outcome).toMatchObject({ kind: 'fail', reason: null, note: 'come again' });
      expect(answer.body.visit.openCorrections).toBe(1);
      expect(answer.body.corrections).toMatchObject([
        {
          number: 1,
          subject: 'dwv',
          state: 'open',
          place: { x: 0.4, y: 0.25 },
          room: 'bath',
          openedBy: 'Noor Haverty',
          abilities: { canFix: false, canDecide: false },
        },
        { number: 2, subject: 'work', pointCode: 'nail-plates', place: 'whole-system', severity: 'note' },
      ]);
      expect(await eventsOf(visit.id)).toEqual(['correction-opened', 'correction-opened', 'outcome']);
      expect(await plumbingOf(visit.lotId)).toBe('corrections-open');
      expect(await plumbingOf(world.lots[0].id)).toBe('clear');
    });

    it('cannot be recorded again, nor on what is not underway', async () => {
      expect((await recordAs('inspector', visit, seenResult()).expect(409)).body).toMatchObject({
        code: 'stale-state',
        params: { is: 'closed', version: 1 },
      });
      const booked = await scenario.visit(world.lots[3]);
      expect((await recordAs('inspector', booked, seenResult()).expect(409)).body).toMatchObject({
        code: 'stale-state',
        params: { is: 'booked' },
      });
      const elsewhere = await scenario.visit(world.lots[4], { state: 'underway' });
      expect(
        (await recordAs('inspector', elsewhere, seenResult(), { expectedVersion: 4 }).expect(409)).body,
      ).toMatchObject({
        code: 'stale-state',
        params: { is: 'underway', version: 0 },
      });
      const [first] = await OutcomeModel.findAll({ where: { visitId: visit.id } });
      expect(
        (await recordAs('inspector', elsewhere, seenResult(), { clientId: first?.clientId }).expect(400)).body.fields,
      ).toEqual({
        clientId: 'used-before',
      });
      const [used] = await CorrectionModel.findAll({ where: { visitId: visit.id } });
      const repeated = failedDrain({ clientId: used?.clientId });
      expect((await recordAs('inspector', elsewhere, repeated).expect(400)).body.fields).toEqual({
        'result.corrections.0.clientId': 'used-before',
      });
    });
  });

  describe('of several units', () => {
    it('fails for one that was not seen, and keeps their corrections apart', async () => {
      const lot = world.lots[5];
      await LotUnitModel.create({ id: randomUUID(), lotId: lot.id, number: 2, label: 'Flat', geometry: null });
      const visit = await scenario.visit(lot, { state: 'underway', unitNumbers: [1, 2] });
      const result = seenResult();
      result.systems.push(
        { unitNumber: 2, system: 'dwv', answer: 'not-seen' },
        { unitNumber: 2, system: 'water', answer: 'pass' },
      );
      result.corrections.push(correctionBody({ unitNumber: 2, subject: 'water', severity: 'fix-before-final' }));
      const answer = await recordAs('inspector', visit, result).expect(200);
      expect(answer.body.outcome).toMatchObject({ kind: 'fail', reason: 'not-seen' });
      expect([await plumbingOf(lot.id, 1), await plumbingOf(lot.id, 2)]).toContain('corrections-open');
    });
  });

  describe('where nothing was seen', () => {
    it.each([
      ['not-ready', 'not-up'],
      ['no-access', 'locked'],
    ] as const)('%s closes with its reason once the window has opened', async (kind, reason) => {
      const lot = world.lots[kind === 'not-ready' ? 3 : 4];
      const visit = await scenario.visit(lot, { state: 'underway', label: 'noon', stageCode: 'groundwork' });
      const result = { kind, reason } as OutcomeBody['result'];
      expect((await recordAs('inspector', visit, result).expect(409)).body).toMatchObject({
        code: 'window-not-open',
        params: { opensAt: '2027-03-02T18:00:00.000Z' },
      });
      server.clock.set('2027-03-02T18:00:00Z');
      const answer = await recordAs('inspector', visit, result).expect(200);
      server.clock.set(testNow);
      expect(answer.body.visit).toMatchObject({ state: 'closed', outcome: { kind, reason } });
      expect(answer.body.outcome).toMatchObject({ systems: [], work: [] });
    });

    it('knows the pinned reasons only', async () => {
      const visit = await scenario.visit(world.lots[0], { state: 'underway', stageCode: 'groundwork' });
      await recordAs('inspector', visit, {
        kind: 'not-ready',
        reason: 'locked',
      } as unknown as OutcomeBody['result']).expect(400);
    });
  });

  describe('who may', () => {
    let visit: VisitModel;
    beforeAll(async () => {
      visit = await scenario.visit(world.lots[1], { state: 'underway', stageCode: 'final' });
    });

    it('is the inspector whose visit it is', async () => {
      for (const person of [
        'superintendent',
        'builderOwner',
        'plumber',
        'helper',
        'plumberOwner',
        'desk',
        'departmentOwner',
      ] as const) {
        expect((await recordAs(person, visit, seenResult()).expect(403)).body.code).toBe('not-allowed');
      }
      for (const person of ['otherInspector', 'otherPlumber', 'otherDesk', 'operator'] as const) {
        expect((await recordAs(person, visit, seenResult()).expect(404)).body.code).toBe('not-found');
      }
      await world
        .nobody()
        .post(`/api/visits/${visit.id}/outcome`, outcomeBody(scenario, 0, seenResult()))
        .expect(401);
      expect((await recordAs('secondInspector', visit, seenResult()).expect(409)).body.code).toBe('visit-of-another');
    });

    it('is nobody of the lot’s builder, though the visit stands in their name', async () => {
      const own = await scenario.visit(world.lots[2], {
        state: 'underway',
        stageCode: 'final',
        inspector: 'secondInspector',
      });
      await join(world.people.secondInspector, world.organizations.builder, ['owner'], server.clock.now());
      expect((await recordAs('secondInspector', own, seenResult()).expect(403)).body.code).toBe('not-allowed');
    });
  });

  describe('at the same moment', () => {
    it('two that close one visit: one does, the other meets what it is now', async () => {
      const target = await scenario.visit(world.lots[0], { state: 'underway' });
      const answers = await Promise.all([
        recordAs('inspector', target, failedDrain()),
        recordAs('inspector', target, seenResult()),
      ]);
      expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
      expect(answers.find((answer) => answer.status === 409)?.body).toMatchObject({
        code: 'stale-state',
        params: { is: 'closed', version: 1 },
      });
      expect(await OutcomeModel.count({ where: { visitId: target.id } })).toBe(1);
    });

    it('corrections of two visits of one lot are counted one after the other', async () => {
      const lot = world.lots[5];
      const before = await CorrectionModel.count({ where: { lotId: lot.id } });
      const one = await scenario.visit(lot, { state: 'underway', unitNumbers: [1] });
      const two = await scenario.visit(lot, { state: 'underway', unitNumbers: [2], inspector: 'inspector' });
      const ofUnit = (unitNumber: number) => {
        const result = failedDrain({ unitNumber });
        const corrections = [...result.corrections, correctionBody({ unitNumber, subject: 'work', severity: 'note' })];
        return { ...result, corrections, systems: result.systems.map((each) => ({ ...each, unitNumber })) };
      };
      const answers = await Promise.all([recordAs('inspector', one, ofUnit(1)), recordAs('inspector', two, ofUnit(2))]);
      expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
      const rows = await CorrectionModel.findAll({ where: { lotId: lot.id }, order: [['number', 'ASC']] });
      expect(rows.map((row) => row.number)).toEqual(Array.from({ length: before + 4 }, (_each, index) => index + 1));
    });
  });
});
