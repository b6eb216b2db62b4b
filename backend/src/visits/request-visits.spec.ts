import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LotUnitModel } from '../lots/lot-unit.model.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import {
  addClosedVisit,
  addCorrection,
  addLots,
  ask,
  asking,
  book,
  nextDay,
  setRuleCard,
} from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import { ClosureModel } from '../departments/closure.model.js';
import { LotModel } from '../lots/lot.model.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

const newLots = (count: number) => addLots(server, world, count);
async function newLot(overrides: Partial<LotModel> = {}): Promise<LotModel> {
  const [lot] = await newLots(1);
  return (lot as LotModel).update(overrides);
}
const eventsOf = (visitId: string) =>
  server.db.query<{ kind: string; payload: Record<string, unknown> }>(
    'SELECT kind, payload FROM outbox_events WHERE visit_id = :visitId',
    {
      replacements: { visitId },
      type: QueryTypes.SELECT,
    },
  );
const ledgerOf = (lotId: string) =>
  server.db.query<{ kind: string; actor_role: string; payload: Record<string, unknown> }>(
    'SELECT kind, actor_role, payload FROM ledger_entries WHERE lot_id = :lotId ORDER BY sequence',
    { replacements: { lotId }, type: QueryTypes.SELECT },
  );

describe('a request under a rule card that lets one book', () => {
  it('is a booked visit with an inspector, a planned span and a place, told once', async () => {
    const lot = await newLot();
    const visit = await book(world, lot, { note: 'Dog in the yard' });
    expect(visit).toMatchObject({
      state: 'booked',
      version: 0,
      unitNumbers: [1],
      note: 'Dog in the yard',
      isRetest: false,
      hasFirstPlace: false,
    });
    // Gil Strand comes before Noor Haverty by name
    expect(visit.inspector?.name).toBe('Gil Strand');
    expect([visit.plannedStartAt, visit.plannedEndAt]).toEqual([
      '2027-03-03T14:30:00.000Z',
      '2027-03-03T15:00:00.000Z',
    ]);
    expect(visit.moves).toEqual(['withdraw', 'move']);
    expect(await ledgerOf(lot.id)).toMatchObject([
      { kind: 'visit-requested', actor_role: 'superintendent', payload: { visitId: visit.id, callerName: null } },
      { kind: 'visit-booked', payload: { visitId: visit.id, inspectorName: 'Gil Strand' } },
    ]);
    expect(await eventsOf(visit.id)).toMatchObject([
      {
        kind: 'visit-booked',
        payload: { visit: { startAt: '2027-03-03T14:30:00.000Z', calendarSequence: 0, inspectorName: 'Gil Strand' } },
      },
    ]);
  });

  it('takes several lots in one act, each its own visit', async () => {
    const lots = await newLots(3);
    const answer = await ask(
      world,
      lots.map(({ id }) => id),
      { label: 'mid' },
    );
    expect(answer.status).toBe(201);
    expect(answer.body.visits.map((visit: { lotId: string }) => visit.lotId)).toEqual(lots.map(({ id }) => id));
    const rows = await VisitModel.findAll({ where: { windowDate: nextDay, windowLabel: 'mid' }, order: ['place'] });
    expect(rows.map(({ place }) => place)).toEqual([1, 2, 3]);
  });

  it('takes all of them or none', async () => {
    const lots = await newLots(4);
    const answer = await ask(
      world,
      lots.map(({ id }) => id),
      { label: 'late' },
    );
    expect(answer.body).toMatchObject({ code: 'window-full', params: { room: 3 } });
    expect(await VisitModel.count({ where: { lotId: lots.map(({ id }) => id) } })).toBe(0);
    expect(await ledgerOf(lots[0]?.id ?? '')).toEqual([]);
  });

  it('is for every unit that has not passed, or for those named', async () => {
    const lot = await newLot();
    for (const number of [2, 3])
      await LotUnitModel.create({
        id: crypto.randomUUID(),
        lotId: lot.id,
        number,
        label: `Unit ${number}`,
        geometry: null,
      });
    expect((await book(world, lot, { date: '2027-03-04', unitNumbers: [3] })).unitNumbers).toEqual([3]);
    expect((await ask(world, [lot.id], { date: '2027-03-04', unitNumbers: [3] })).body).toMatchObject({
      code: 'open-visit-exists',
    });
    expect(
      (await book(world, lot, { date: '2027-03-04', unitNumbers: [2, 1] })).systemsUp.map(
        ({ unitNumber }) => unitNumber,
      ),
    ).toEqual([1, 1, 2, 2]);
    const unknown = await ask(world, [lot.id], { unitNumbers: [4] });
    expect(unknown.body).toMatchObject({ code: 'bad-input', fields: { 'lots.0.unitNumbers': 'no-such-unit' } });
  });

  it('gives the first answer again to the same request, and books once', async () => {
    const lot = await newLot();
    const body = { lots: [{ lotId: lot.id }], stageCode: 'rough-in', date: '2027-03-08', label: 'early' };
    const key = 'the-same-key-twice';
    const caller = world.as('superintendent');
    const answers = await Promise.all([
      caller.post('/api/visits', body, { key }),
      caller.post('/api/visits', body, { key }),
    ]);
    expect(answers.map(({ status }) => status)).toEqual([201, 201]);
    expect(answers[0]?.body).toEqual(answers[1]?.body);
    expect(await VisitModel.count({ where: { lotId: lot.id } })).toBe(1);
    const other = await caller.post('/api/visits', { ...body, label: 'mid' }, { key });
    expect(other.body).toMatchObject({ code: 'idempotency-key-reused' });
  });

  it('never sends an inspector who belongs to the lot’s builder or plumber', async () => {
    const { createdAt } = world.people.secondInspector;
    await server.db.query(
      `INSERT INTO memberships (id, person_id, organization_id, roles, created_at) VALUES (gen_random_uuid(), :person, :organization, '{owner}', :createdAt)`,
      {
        replacements: {
          person: world.people.secondInspector.id,
          organization: world.organizations.builder.id,
          createdAt,
        },
      },
    );
    expect((await book(world, await newLot(), { date: '2027-03-08', label: 'noon' })).inspector?.name).toBe(
      'Noor Haverty',
    );
    await server.db.query('DELETE FROM memberships WHERE person_id = :person AND organization_id = :organization', {
      replacements: { person: world.people.secondInspector.id, organization: world.organizations.builder.id },
    });
  });
});

describe('who may ask', () => {
  it.each([
    ['plumber', 201],
    ['helper', 403],
    ['plumberOwner', 403],
    ['builderOwner', 403],
    ['inspector', 403],
    ['departmentOwner', 403],
    ['otherSuperintendent', 404],
    ['otherPlumber', 404],
    ['otherDesk', 404],
    ['otherInspector', 404],
    ['operator', 404],
  ] as const)('%s: %i', async (by, status) => {
    const answer = await ask(world, [(await newLot()).id], { by, date: '2027-03-09' });
    expect(answer.status).toBe(status);
    if (status !== 201) expect(answer.body.code).toBe(status === 404 ? 'not-found' : 'not-allowed');
  });

  it('the plumber only where the lot lets them, and only as the rule card does', async () => {
    const lot = await newLot({ mayPlumberRequest: false });
    expect((await ask(world, [lot.id], { by: 'plumber' })).body).toMatchObject({
      code: 'may-not-request',
      params: { lots: [lot.number] },
    });
    await setRuleCard(
      server,
      world.ruleCard.id,
      ruleCardContent({ asking: asking({ whoMayRequest: ['superintendent'] }) }),
    );
    const open = await newLot();
    expect((await ask(world, [open.id], { by: 'plumber' })).body).toMatchObject({ code: 'may-not-request' });
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
  });

  it('the desk for a caller, whose name it gives', async () => {
    const lot = await newLot();
    const nameless = await ask(world, [lot.id], { by: 'desk', date: '2027-03-09', label: 'mid' });
    expect(nameless.body).toMatchObject({ code: 'bad-input', fields: { callerName: 'required' } });
    const visit = await book(world, lot, { by: 'desk', date: '2027-03-09', label: 'mid', callerName: 'Della' });
    expect(visit.moves).toContain('withdraw');
    expect(await ledgerOf(lot.id)).toMatchObject([
      { kind: 'visit-requested', actor_role: 'desk', payload: { callerName: 'Della' } },
      {},
    ]);
    expect((await ask(world, [(await newLot()).id], { callerName: 'Nobody' })).body).toMatchObject({
      code: 'not-allowed',
    });
  });

  it('nobody for a lot of another set beside the own', async () => {
    expect((await ask(world, [(await newLot()).id, world.otherLot.id])).body).toMatchObject({ code: 'not-found' });
  });
});

describe('a request is refused, with nothing written', () => {
  const refused = async (lot: LotModel, wish: Parameters<typeof ask>[2] = {}) => {
    const answer = await ask(world, [lot.id], wish);
    expect(await VisitModel.count({ where: { lotId: lot.id, state: 'booked' } })).toBe(0);
    return answer;
  };

  it('for a permit not issued where the rule card needs it', async () => {
    const lot = await newLot({ permitStatus: 'applied' });
    const answer = await refused(lot);
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'permit-not-issued', params: { lots: [lot.number] } });
  });

  it('for a window in the past, today’s after the cut-off, or beyond the horizon', async () => {
    const lot = await newLot();
    expect((await refused(lot, { date: '2027-03-01' })).body).toMatchObject({ code: 'window-past' });
    expect((await refused(lot, { date: '2027-03-02', label: 'mid' })).body).toMatchObject({ code: 'window-past' });
    expect((await refused(lot, { date: '2027-03-02', label: 'late' })).body).toMatchObject({
      code: 'cut-off-passed',
      params: { firstDate: '2027-03-03' },
    });
    expect((await refused(lot, { date: '2027-03-22' })).body).toMatchObject({
      code: 'beyond-horizon',
      params: { lastDate: '2027-03-18' },
    });
  });

  it('for a window the rule card does not have', async () => {
    const lot = await newLot();
    expect((await refused(lot, { label: 'midnight' })).body).toMatchObject({
      code: 'window-unknown',
      fields: { label: 'no-such-window' },
    });
    expect((await refused(lot, { date: '2027-03-05' })).body).toMatchObject({ code: 'window-unknown' }); // a Friday
  });

  it('on a closure, whole or of part of a day, and on a federal holiday', async () => {
    const close = (date: string, fromTime: string | null, toTime: string | null) =>
      ClosureModel.create({
        id: crypto.randomUUID(),
        departmentId: world.organizations.department.id,
        date,
        fromTime,
        toTime,
        why: 'Training',
        createdAt: server.clock.now(),
      });
    const whole = await close('2027-03-10', null, null);
    const part = await close('2027-03-11', '10:00', '12:00');
    const lot = await newLot();
    expect((await refused(lot, { date: '2027-03-10' })).body).toMatchObject({
      code: 'window-closed',
      params: { why: 'Training' },
    });
    for (const label of ['mid', 'noon'])
      expect((await refused(lot, { date: '2027-03-11', label })).body).toMatchObject({ code: 'window-closed' });
    expect((await ask(world, [(await newLot()).id], { date: '2027-03-11', label: 'early' })).status).toBe(201);
    for (const closure of [whole, part]) await closure.update({ removedAt: server.clock.now() });
    // Memorial Day 2027 is Monday May 31 (5 U.S.C. 6103)
    server.clock.set('2027-05-26T16:30:00Z');
    expect((await refused(lot, { date: '2027-05-31' })).body).toMatchObject({
      code: 'window-closed',
      params: { why: 'memorial-day' },
    });
    server.clock.set(testNow);
  });

  it('for a full window, with the next best offers', async () => {
    for (const lot of await newLots(3)) await book(world, lot, { date: '2027-03-15', label: 'early' });
    const answer = await refused(await newLot(), { date: '2027-03-15', label: 'early' });
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'window-full', params: { why: 'full' } });
    const offers = answer.body.params.offers as Array<{ isTakeable: boolean; startAt: string }>;
    expect(offers).toHaveLength(3);
    expect(offers.every(({ isTakeable }) => isTakeable)).toBe(true);
    expect(offers.map(({ startAt }) => startAt)).toEqual(offers.map(({ startAt }) => startAt).sort());
  });

  it('for room without an inspector’s time', async () => {
    await server.db.query(`UPDATE memberships SET is_disabled = true WHERE person_id = :id`, {
      replacements: { id: world.people.secondInspector.id },
    });
    const [first] = await newLots(1);
    await book(world, first as LotModel, { date: '2027-03-16', label: 'early' });
    await setRuleCard(server, world.ruleCard.id, longVisits());
    expect((await refused(await newLot(), { date: '2027-03-16', label: 'early' })).body).toMatchObject({
      code: 'window-full',
      params: { why: 'no-inspector' },
    });
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
    await server.db.query(`UPDATE memberships SET is_disabled = false WHERE person_id = :id`, {
      replacements: { id: world.people.secondInspector.id },
    });
  });

  it('for an open visit of the same stage, not for one of another', async () => {
    const lot = await newLot();
    await book(world, lot, { date: '2027-03-17' });
    expect((await ask(world, [lot.id], { date: '2027-03-18' })).body).toMatchObject({
      code: 'open-visit-exists',
      params: { lots: [lot.number] },
    });
    expect((await ask(world, [lot.id], { date: '2027-03-18', stageCode: 'groundwork' })).status).toBe(201);
  });

  it('for open corrections, counted; fixed ones may be tested again, and the request is a re-test', async () => {
    const lot = await newLot();
    const failed = await addClosedVisit(server, world, lot, 'fail');
    const first = await addCorrection(world, failed, 1);
    const second = await addCorrection(world, failed, 2);
    await addCorrection(world, failed, 3, { severity: 'note' });
    expect((await refused(lot, { date: '2027-03-17' })).body).toMatchObject({
      code: 'corrections-open',
      params: { count: 2, lots: [lot.number] },
    });
    const fixed = {
      state: 'fixed',
      fixedAt: server.clock.now(),
      fixedBy: world.people.plumber.id,
      fixNote: 'Set one',
    } as const;
    for (const each of [first, second]) await each.update(fixed);
    expect(await book(world, lot, { date: '2027-03-17' })).toMatchObject({ isRetest: true, openCorrections: 0 });
  });

  it('for a stage that has passed', async () => {
    const lot = await newLot();
    await server.db.query(
      `INSERT INTO clearances (lot_id, unit_number, stage_code, state, since) VALUES (:id, 1, 'rough-in', 'put-back-due', :now)`,
      {
        replacements: { id: lot.id, now: server.clock.now() },
      },
    );
    expect((await refused(lot)).body).toMatchObject({ code: 'stage-passed' });
  });

  it('for a stage nobody knows, too many lots, a lot named twice, none, or one without a department', async () => {
    const lot = await newLot();
    const unknown = await refused(lot, { stageCode: 'roof' });
    expect(unknown.status).toBe(400);
    expect(unknown.body).toMatchObject({ code: 'stage-unknown', fields: { stageCode: 'unknown' } });
    await setRuleCard(server, world.ruleCard.id, ruleCardContent({ asking: asking({ lotsPerRequest: 1 }) }));
    expect((await ask(world, [lot.id, world.lots[0].id])).body).toMatchObject({
      code: 'too-many-lots',
      params: { most: 1, asked: 2 },
    });
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
    expect((await ask(world, [lot.id, lot.id])).body).toMatchObject({
      code: 'bad-input',
      fields: { 'lots.1.lotId': 'named-twice' },
    });
    expect((await ask(world, [])).body).toMatchObject({ code: 'bad-input' });
    expect((await refused(await newLot({ departmentId: null }))).body).toMatchObject({
      code: 'lot-without-department',
    });
    expect((await refused(lot, { date: 'tomorrow' })).body).toMatchObject({
      code: 'bad-input',
      fields: { date: expect.any(String) },
    });
  });

  it('for a re-inspection outside the windows kept for them', async () => {
    await setRuleCard(
      server,
      world.ruleCard.id,
      ruleCardContent({ asking: asking({ reinspectionWindows: ['late'] }) }),
    );
    const lot = await newLot();
    const failed = await addClosedVisit(server, world, lot, 'fail');
    await addCorrection(world, failed, 1, { state: 'fixed' });
    expect((await refused(lot, { date: '2027-03-18', label: 'mid' })).body).toMatchObject({
      code: 'window-unknown',
      fields: { label: 'not-for-this-visit' },
    });
    expect((await book(world, lot, { date: '2027-03-18', label: 'late' })).isRetest).toBe(true);
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
  });
});

describe('a request under a rule card whose desk places', () => {
  it('waits without an inspector, told to the desk; the calendar knows nothing of it', async () => {
    const answer = await ask(world, [world.otherLot.id], { by: 'otherSuperintendent' });
    expect(answer.body.visits).toMatchObject([
      { state: 'requested', inspector: null, plannedStartAt: null, zone: 'America/Chicago' },
    ]);
    const [visit] = answer.body.visits;
    expect(await eventsOf(visit.id)).toMatchObject([{ kind: 'visit-requested' }]);
    expect((await ledgerOf(world.otherLot.id)).map(({ kind }) => kind)).toEqual(['visit-requested']);
  });
});

/** Visits so long that one fills a window. */
function longVisits() {
  const { stages, ...content } = ruleCardContent();
  return { ...content, stages: stages.map((stage) => ({ ...stage, minutesPerVisit: 75 })) };
}
