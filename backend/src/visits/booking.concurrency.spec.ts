import fc from 'fast-check';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { spanOf } from '../common/time/ranges.js';
import type { LotModel } from '../lots/lot.model.js';
import { addLots, ask, book, readVisit } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let second: TestApp;
let world: World;
let lots: LotModel[];
beforeAll(async () => {
  server = await startTestApp();
  second = await startTestApp({ database: server.database });
  world = await createWorld(server);
  lots = await addLots(server, world, 60);
});
afterAll(async () => {
  await second?.close();
  await server?.close();
});

const statusCounts = (answers: ReadonlyArray<{ status: number }>, status: number) =>
  answers.filter((answer) => answer.status === status).length;

describe('the last room of a window', () => {
  it('is taken by exactly one of 50 who ask at once; the others are told the next best', async () => {
    const [first, other, ...rest] = lots as [LotModel, LotModel, ...LotModel[]];
    for (const lot of [first, other]) await book(world, lot, { date: '2027-03-04', label: 'early' });
    const answers = await Promise.all(
      rest.slice(0, 50).map((lot) => ask(world, [lot.id], { date: '2027-03-04', label: 'early' })),
    );
    expect(statusCounts(answers, 201)).toBe(1);
    const refused = answers.filter(({ status }) => status !== 201);
    expect(refused).toHaveLength(49);
    for (const { status, body } of refused) {
      expect(status).toBe(409);
      expect(body.code).toBe('window-full');
      expect(body.params.offers).toHaveLength(3);
    }
    const taken = await VisitModel.findAll({
      where: { windowDate: '2027-03-04', windowLabel: 'early', state: 'booked' },
      order: ['place'],
    });
    expect(taken.map(({ place }) => place)).toEqual([1, 2, 3]);
    const booked = await server.db.query<{ count: number }>(
      `SELECT count(*)::int AS count FROM outbox_events WHERE kind = 'visit-booked' AND visit_id = ANY (ARRAY[:ids]::uuid[])`,
      { replacements: { ids: taken.map(({ id }) => id) }, type: QueryTypes.SELECT },
    );
    expect(booked).toEqual([{ count: 3 }]);
  });

  it('is taken once by requests over two servers', async () => {
    const wanted = lots.slice(2, 14);
    const url = (index: number) => (index % 2 === 0 ? server.url : second.url);
    const answers = await Promise.all(
      wanted.map((lot, index) =>
        fetch(`${url(index)}/api/visits`, {
          method: 'POST',
          headers: { 'content-type': 'application/json', authorization: `Bearer ${world.tokenOf('superintendent')}` },
          body: JSON.stringify({
            lots: [{ lotId: lot.id }],
            stageCode: 'groundwork',
            date: '2027-03-08',
            label: 'mid',
          }),
        }),
      ),
    );
    expect(statusCounts(answers, 201)).toBe(3);
    expect(statusCounts(answers, 409)).toBe(9);
  });
});

describe('one lot asked for twice at once', () => {
  it('has one visit', async () => {
    const lot = lots.at(-1) as LotModel;
    const labels = ['early', 'mid', 'noon', 'late', 'early', 'mid', 'noon', 'late'];
    const answers = await Promise.all(labels.map((label) => ask(world, [lot.id], { date: '2027-03-09', label })));
    expect(statusCounts(answers, 201)).toBe(1);
    for (const { status, body } of answers) if (status !== 201) expect(body.code).toBe('open-visit-exists');
    expect(await VisitModel.count({ where: { lotId: lot.id } })).toBe(1);
  });
});

describe('two moves of one visit at once', () => {
  it('one is made, the other is told what the visit is now', async () => {
    const visit = await book(world, lots.at(-2) as LotModel, { date: '2027-03-10', label: 'early' });
    const withdrawal = { expectedVersion: 0, reason: 'plans-changed' };
    const answers = await Promise.all([
      world.as('superintendent').post(`/api/visits/${visit.id}/withdraw`, withdrawal),
      world.as('desk').post(`/api/visits/${visit.id}/free`, { expectedVersion: 0, reason: 'Truck broke down' }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const now = await readVisit(world, visit.id);
    const refused = answers.find(({ status }) => status === 409);
    expect(refused?.body).toMatchObject({ code: 'stale-state', params: { is: now.state, version: 1 } });
  });

  it('two moves to two windows leave it in one of them', async () => {
    const visit = await book(world, lots.at(-3) as LotModel, { date: '2027-03-10', label: 'early' });
    const to = (label: string) =>
      world
        .as('superintendent')
        .post(`/api/visits/${visit.id}/move`, { expectedVersion: 0, date: '2027-03-10', label });
    const answers = await Promise.all([to('mid'), to('noon')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const moved = answers.find(({ status }) => status === 200)?.body;
    expect((await readVisit(world, visit.id)).window).toEqual(moved.window);
  });

  it('two visits that change windows at once do not wait for each other for ever', async () => {
    const [a, b] = lots.slice(-5, -3) as [LotModel, LotModel];
    const one = await book(world, a, { date: '2027-03-15', label: 'early' });
    const two = await book(world, b, { date: '2027-03-16', label: 'early' });
    const move = (id: string, date: string) =>
      world.as('superintendent').post(`/api/visits/${id}/move`, { expectedVersion: 0, date, label: 'late' });
    const answers = await Promise.all([move(one.id, '2027-03-16'), move(two.id, '2027-03-15')]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
  });
});

describe('whatever is booked, moved and withdrawn at once', () => {
  const label = fc.constantFrom('early', 'mid', 'noon', 'late');
  const date = fc.constantFrom('2027-03-17', '2027-03-18');
  const act = fc.record({
    lot: fc.integer({ min: 0, max: 19 }),
    label,
    date,
    kind: fc.constantFrom('ask', 'ask', 'move', 'withdraw'),
  });

  it('no inspector is planned in two places, no place is taken twice, nobody is sent outside the window', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(act, { minLength: 12, maxLength: 30 }), async (acts) => {
        await Promise.all(acts.map(({ kind, lot, ...wish }) => perform(kind, lots[20 + lot] as LotModel, wish)));
        const planned = await VisitModel.findAll({ where: { state: ['booked', 'ready', 'underway'] } });
        const spans = planned.map((visit) => ({
          visit,
          window: spanOf(visit.window),
          ...spanOf(visit.planned ?? visit.window),
        }));
        for (const one of spans) {
          expect(one.startAt >= one.window.startAt && one.endAt <= one.window.endAt).toBe(true);
          for (const other of spans) {
            const isOther = one.visit.id !== other.visit.id && one.visit.inspectorId === other.visit.inspectorId;
            if (isOther) expect(one.endAt <= other.startAt || other.endAt <= one.startAt).toBe(true);
          }
        }
        const places = planned.map(({ windowDate, windowLabel, place }) => `${windowDate} ${windowLabel} ${place}`);
        expect(new Set(places).size).toBe(places.length);
      }),
      // the database remembers, so a shrunk case would not be the same case
      { numRuns: 4, endOnFailure: true },
    );
  });

  /** Only answers of the table are good ones: done, or a refusal with its code. */
  async function perform(kind: string, lot: LotModel, wish: { label: string; date: string }): Promise<void> {
    const open = await VisitModel.findOne({ where: { lotId: lot.id, state: 'booked', stageCode: 'final' } });
    const answer =
      kind === 'ask' || open === null
        ? await ask(world, [lot.id], { ...wish, stageCode: 'final' })
        : kind === 'move'
          ? await world
              .as('superintendent')
              .post(`/api/visits/${open.id}/move`, { expectedVersion: open.version, ...wish })
          : await world
              .as('superintendent')
              .post(`/api/visits/${open.id}/withdraw`, { expectedVersion: open.version, reason: 'weather' });
    expect([200, 201, 400, 409]).toContain(answer.status);
    if (answer.status === 400) expect(answer.body.fields).toEqual({ label: 'same-window' });
    if (answer.status === 409) expect(['window-full', 'open-visit-exists', 'stale-state']).toContain(answer.body.code);
  }
});
