import { randomUUID } from 'node:crypto';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { LotModel } from '../lots/lot.model.js';
import { OutboxWorker } from '../notices/outbox-worker.service.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { addLots, ask, book, readVisit, setRuleCard } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import { FreeNotUp } from '../visits/free-not-up.service.js';
import { VisitModel } from '../visits/visit.model.js';
import { HoldScenario } from './holds.scenario.js';
import { ReadingModel } from './reading.model.js';
import { TestUpModel } from './test-up.model.js';

/** A lot with both systems standing since six in the morning of Wednesday 2027-03-03, its window `early`, 7:30 to 9:00. */
interface Case {
  lot: LotModel;
  visit: VisitSummary;
  water: Hold;
}

// Denver is UTC−7 that day (IANA tz): the deadline of 7:00 is 14:00Z, the window 14:30Z to 16:00Z.
const deadline = '2027-03-03T14:00:00Z';

describe('test up said without signal', () => {
  let mailbox: Awaited<ReturnType<typeof startMailbox>>;
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  beforeAll(async () => {
    mailbox = await startMailbox({});
    server = await startTestApp({ environment: { SMTP_URL: mailbox.smtpUrl } });
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
  });
  afterAll(async () => {
    await server?.close();
    await mailbox?.stop();
  });

  beforeEach(async () => {
    const planned = ['requested', 'booked', 'ready', 'underway'];
    await VisitModel.update({ state: 'withdrawn', endedAt: server.clock.now() }, { where: { state: planned } });
    server.clock.set(testNow);
    const { readiness } = ruleCardContent();
    const upBy = { kind: 'clock-time', time: '07:00' } as const;
    const content = ruleCardContent({ readiness: { ...readiness, upBy, whenNotUp: 'goes-to-standby' } });
    await setRuleCard(server, world.ruleCard.id, content);
  });

  const standing = async (): Promise<Case> => {
    server.clock.set(testNow);
    const [lot] = (await addLots(server, world, 1)) as [LotModel];
    const visit = await book(world, lot, { label: 'early' });
    server.clock.set('2027-03-03T13:00:00Z');
    const { water } = await scenario.standUp(lot);
    return { lot, visit, water };
  };
  const sweep = () => server.get(FreeNotUp).sweepDeadlines(server.clock.now());
  const freed = async (): Promise<Case> => {
    const one = await standing();
    server.clock.set('2027-03-03T14:00:01Z');
    expect(await sweep()).toEqual([one.visit.id]);
    return one;
  };
  /** What the phone wrote at 6:40, with a reading of that moment. */
  const saidAt = ({ water }: Case, at = '2027-03-03T13:40:00.000Z', pressurePsi = 118) => ({
    clientId: randomUUID(),
    madeAt: at,
    expectedVersion: 0,
    readings: [{ holdId: water.id, clientId: randomUUID(), madeAt: at, pressurePsi, gaugeValve: 'open' }],
  });
  const send = ({ visit }: Case, body: object, options = {}) =>
    world.as('plumber').post(`/api/visits/${visit.id}/test-up`, body, options);
  const readingsOf = ({ water }: Case) => ReadingModel.count({ where: { holdId: water.id } });
  const rowOf = (restoresId: string) => VisitModel.findOne({ where: { restoresId } });
  const kindsOf = async (table: 'ledger_entries' | 'outbox_events', visitId: string) => {
    const [where, order] =
      table === 'ledger_entries'
        ? [`payload ->> 'visitId' = :visitId`, 'sequence']
        : ['visit_id = :visitId', 'position'];
    const rows = await server.db.query<{ kind: string }>(`SELECT kind FROM ${table} WHERE ${where} ORDER BY ${order}`, {
      replacements: { visitId },
      type: QueryTypes.SELECT,
    });
    return rows.map(({ kind }) => kind);
  };
  /** Makes a visit of another lot in a window of the same day, its test up so that no sweep frees it. */
  const otherVisit = async (label: string): Promise<VisitSummary> => {
    const now = server.clock.now();
    server.clock.set(testNow);
    const visit = await book(world, (await addLots(server, world, 1))[0] as LotModel, { label });
    await VisitModel.update({ state: 'ready', readyAt: server.clock.now() }, { where: { id: visit.id } });
    server.clock.set(now);
    return visit;
  };
  const moveToEarly = (visit: VisitSummary, inspectorId?: string) =>
    world
      .as('desk')
      .post(`/api/visits/${visit.id}/move`, {
        expectedVersion: 0,
        date: '2027-03-03',
        label: 'early',
        ...(inspectorId && { inspectorId }),
      })
      .expect(200);

  describe('in time, and sent after the window was freed', () => {
    it('books the same window again with the same inspector, ready from the moment it was said', async () => {
      const one = await freed();
      server.clock.set('2027-03-03T14:10:00Z');
      const body = saidAt(one);
      const answer = await send(one, body).expect(200);
      expect(answer.body.id).not.toBe(one.visit.id);
      expect(answer.body).toMatchObject({
        state: 'ready',
        version: 1,
        upSince: body.madeAt,
        window: one.visit.window,
        inspector: { id: one.visit.inspector?.id },
        plannedStartAt: one.visit.plannedStartAt,
        stageCode: 'rough-in',
        unitNumbers: [1],
        hasFirstPlace: true,
      });
      expect((await rowOf(one.visit.id))?.id).toBe(answer.body.id);
      expect(await readVisit(world, one.visit.id)).toMatchObject({ state: 'freed', endReason: 'not-up', version: 1 });
      expect(await readingsOf(one)).toBe(2);
      const statement = await TestUpModel.findOne({ where: { clientId: body.clientId }, rejectOnEmpty: true });
      expect(statement).toMatchObject({ visitId: answer.body.id, saidBy: world.people.plumber.id, endedAt: null });
      expect(await kindsOf('ledger_entries', answer.body.id)).toEqual(['visit-restored', 'test-up']);
      expect(await kindsOf('outbox_events', answer.body.id)).toEqual(['visit-restored', 'test-up']);
      expect(await sweep()).toEqual([]);
    });

    it('takes the old entry out of three calendars and puts a new one in', async () => {
      const one = await freed();
      const sentOf = async (method: string, visitId: string): Promise<string[]> => {
        await server.get(OutboxWorker).drain();
        const uid = (await VisitModel.findByPk(visitId))?.calendarUid ?? 'none';
        const isOfVisit = (text: string) => text.replaceAll(/\r?\n /g, '').includes(uid);
        return mailbox
          .messages({})
          .filter(({ calendars: [part] }) => part?.method === method && isOfVisit(part.text))
          .flatMap(({ to }) => to)
          .sort();
      };
      const inspector = one.visit.inspector?.name === 'Noor Haverty' ? 'inspector' : 'secondInspector';
      const three = [inspector, 'plumber', 'superintendent'].map((name) => `${name.toLowerCase()}@example.test`).sort();
      expect(await sentOf('CANCEL', one.visit.id)).toEqual(three);
      const { body } = await send(one, saidAt(one)).expect(200);
      expect(await sentOf('REQUEST', body.id)).toEqual(three);
    });

    it('gives the first answer when it is sent twice, by its client id or by its key', async () => {
      const one = await freed();
      server.clock.set('2027-03-03T14:10:00Z');
      const body = saidAt(one);
      const first = await send(one, body, { key: 'said-twice-1' }).expect(200);
      expect((await send(one, body, { key: 'said-twice-1' }).expect(200)).body).toEqual(first.body);
      expect((await send(one, body).expect(200)).body).toEqual(first.body);
      expect(await VisitModel.count({ where: { restoresId: one.visit.id } })).toBe(1);
      expect(await TestUpModel.count({ where: { clientId: body.clientId } })).toBe(1);
      expect(await readingsOf(one)).toBe(2);
      // another statement finds the right used up
      const other = await send(one, saidAt(one)).expect(409);
      expect(other.body).toMatchObject({ code: 'said-too-late', params: { why: 'other-visit', readingsKept: 1 } });
    });

    it('gives one answer to two at the same moment', async () => {
      const one = await freed();
      const body = saidAt(one);
      const answers = await Promise.all([send(one, body), send(one, body)]);
      expect(answers.map(({ status }) => status)).toEqual([200, 200]);
      expect(answers[0]?.body.id).toBe(answers[1]?.body.id);
      expect(await VisitModel.count({ where: { restoresId: one.visit.id } })).toBe(1);
    });

    it('takes another place and another time of the window where its own are gone', async () => {
      const one = await freed();
      const other = await otherVisit('mid');
      await moveToEarly(other, one.visit.inspector?.id);
      expect((await VisitModel.findByPk(other.id))?.place).toBe(1);
      const { body } = await send(one, saidAt(one)).expect(200);
      expect(body).toMatchObject({ state: 'ready', inspector: { id: one.visit.inspector?.id } });
      expect(Date.parse(body.plannedStartAt)).toBeGreaterThan(Date.parse(one.visit.plannedStartAt ?? ''));
      expect((await rowOf(one.visit.id))?.place).toBe(2);
    });

    it('is planned in what is left of a window already open', async () => {
      const one = await freed();
      server.clock.set('2027-03-03T15:05:00Z');
      const { body } = await send(one, saidAt(one)).expect(200);
      expect(body).toMatchObject({ state: 'ready', plannedStartAt: '2027-03-03T15:05:00.000Z' });
    });

    it('does so once: a visit withdrawn since is not brought back by another statement', async () => {
      const one = await freed();
      const { body } = await send(one, saidAt(one)).expect(200);
      const withdraw = { expectedVersion: body.version, reason: 'plans-changed' };
      await world.as('superintendent').post(`/api/visits/${body.id}/withdraw`, withdraw).expect(200);
      expect((await send(one, saidAt(one)).expect(409)).body).toMatchObject({
        code: 'said-too-late',
        params: { why: 'other-visit', readingsKept: 1 },
      });
    });

    it('may be said down again, and is not freed a second time', async () => {
      const one = await freed();
      const { body } = await send(one, saidAt(one)).expect(200);
      const down = { clientId: randomUUID(), madeAt: server.clock.now().toISOString(), expectedVersion: 1 };
      const answer = await world.as('plumber').post(`/api/visits/${body.id}/no-longer-up`, down).expect(200);
      expect(answer.body.state).toBe('booked');
      server.clock.set('2027-03-03T14:20:00Z');
      expect(await sweep()).toEqual([]);
    });
  });

  describe('in time, but the window is full by now', () => {
    const full = async (): Promise<Case> => {
      const one = await freed();
      for (let n = 0; n < 3; n += 1) await moveToEarly(await otherVisit('mid'));
      return one;
    };

    it('waits for the desk, first in line, with the readings and the statement kept', async () => {
      const one = await full();
      const body = saidAt(one);
      const answer = await send(one, body).expect(200);
      expect(answer.body).toMatchObject({
        state: 'requested',
        hasFirstPlace: true,
        inspector: null,
        window: one.visit.window,
      });
      expect((await send(one, body).expect(200)).body).toEqual(answer.body);
      const requests = await world
        .as('desk')
        .get(`/api/departments/${world.organizations.department.id}/requests`)
        .expect(200);
      expect(requests.body.items[0].id).toBe(answer.body.id);
      expect(await readingsOf(one)).toBe(2);
      const statement = await TestUpModel.findOne({ where: { clientId: body.clientId }, rejectOnEmpty: true });
      expect(statement).toMatchObject({ visitId: one.visit.id, endNote: 'window-gone' });
      expect(await kindsOf('ledger_entries', answer.body.id)).toEqual(['visit-first-in-line']);
      expect(await kindsOf('outbox_events', answer.body.id)).toEqual(['visit-first-in-line']);
    });

    it('is placed by the desk and said up like any other', async () => {
      const one = await full();
      const { body } = await send(one, saidAt(one)).expect(200);
      const place = { expectedVersion: 0, date: '2027-03-03', label: 'noon' };
      const placed = await world.as('desk').post(`/api/visits/${body.id}/place`, place).expect(200);
      const up = {
        clientId: randomUUID(),
        madeAt: server.clock.now().toISOString(),
        expectedVersion: placed.body.version,
      };
      expect((await world.as('plumber').post(`/api/visits/${body.id}/test-up`, up).expect(200)).body.state).toBe(
        'ready',
      );
    });
  });

  describe('keeps its readings, and no more', () => {
    const expectRefused = async (one: Case, body: object, why: string, options = {}) => {
      const answer = await send(one, body, options).expect(409);
      expect(answer.body).toMatchObject({ code: 'said-too-late', params: { why, readingsKept: 1 } });
      expect(await readingsOf(one)).toBe(2);
      expect(await rowOf(one.visit.id)).toBeNull();
      // sent again it is the same act, and the same answer
      expect((await send(one, body, options).expect(409)).body.params).toEqual(answer.body.params);
      expect(await readingsOf(one)).toBe(2);
    };

    it('when it was said after the deadline', async () => {
      const one = await freed();
      server.clock.set('2027-03-03T14:10:00Z');
      await expectRefused(one, saidAt(one, '2027-03-03T14:00:00.001Z'), 'after-deadline');
    });

    it('at the very deadline it is in time', async () => {
      const one = await freed();
      await send(one, saidAt(one, deadline)).expect(200);
    });

    it('when only the phone’s clock says it was in time: it runs half an hour behind', async () => {
      const one = await freed();
      server.clock.set('2027-03-03T14:15:00Z');
      const headers = { 'X-Sent-At': new Date(Date.now() - 30 * 60_000).toISOString() };
      await expectRefused(one, saidAt(one, '2027-03-03T13:40:00.000Z'), 'after-deadline', { headers });
    });

    it('when the readings it rests on were made after the deadline', async () => {
      server.clock.set(testNow);
      const [lot] = (await addLots(server, world, 1)) as [LotModel];
      const visit = await book(world, lot, { label: 'early' });
      server.clock.set('2027-03-03T14:05:00Z');
      await sweep();
      const { water } = await scenario.standUp(lot);
      const body = saidAt({ lot, visit, water }, '2027-03-03T14:04:00.000Z');
      await expectRefused({ lot, visit, water }, { ...body, madeAt: '2027-03-03T13:50:00Z' }, 'after-deadline');
    });

    it('when the window is over', async () => {
      const one = await freed();
      server.clock.set('2027-03-03T16:00:00Z');
      await expectRefused(one, saidAt(one), 'window-over');
    });

    it('when another window was asked for since', async () => {
      const one = await freed();
      expect((await ask(world, [one.lot.id], { date: '2027-03-04' })).status).toBe(201);
      await expectRefused(one, saidAt(one), 'other-visit');
    });

    it('when the desk freed the window and not the deadline', async () => {
      const one = await standing();
      const free = { expectedVersion: 0, reason: 'not-up' };
      await world.as('desk').post(`/api/visits/${one.visit.id}/free`, free).expect(200);
      server.clock.set('2027-03-03T14:10:00Z');
      const answer = await send(one, saidAt(one)).expect(409);
      expect(answer.body).toMatchObject({ code: 'stale-state', params: { is: 'freed', version: 1, readingsKept: 1 } });
      expect(await readingsOf(one)).toBe(2);
      expect(await rowOf(one.visit.id)).toBeNull();
    });

    it('when the test stands over its lowest-rated part: that is told before anything else', async () => {
      const one = await freed();
      const answer = await send(one, saidAt(one, undefined, 161)).expect(409);
      expect(answer.body).toMatchObject({ code: 'over-limit', params: { pressurePsi: 161, ceilingPsi: 160 } });
      expect(await readingsOf(one)).toBe(2);
      expect(await rowOf(one.visit.id)).toBeNull();
    });

    it('when the test came down since', async () => {
      const one = await freed();
      const end = { clientId: randomUUID(), madeAt: server.clock.now().toISOString(), reason: 'lost' };
      await world.as('plumber').post(`/api/holds/${one.water.id}/end`, end).expect(200);
      const answer = await send(one, saidAt(one)).expect(409);
      expect(answer.body).toMatchObject({ code: 'reading-missing', params: { missing: [{ why: 'no-test' }] } });
      expect(await readingsOf(one)).toBe(2);
    });
  });

  it('is nobody’s but the plumber’s, and nothing of it is kept for a stranger', async () => {
    const one = await freed();
    for (const person of ['superintendent', 'helper', 'desk'] as const)
      await world.as(person).post(`/api/visits/${one.visit.id}/test-up`, saidAt(one)).expect(403);
    await world.as('otherPlumber').post(`/api/visits/${one.visit.id}/test-up`, saidAt(one)).expect(404);
    expect(await readingsOf(one)).toBe(1);
  });
});
