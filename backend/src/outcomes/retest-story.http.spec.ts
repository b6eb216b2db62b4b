import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { HoldScenario } from '../holds/holds.scenario.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { correctionBody, outcomeBody, seenResult } from './outcomes.scenario.js';

/** The whole way of one lot, by the API alone: asked for, tested, failed, put right, tested again, passed. */
describe('a fail and its re-test', () => {
  let server: TestApp;
  let world: World;
  let scenario: HoldScenario;
  let visit: VisitSummary;
  let holds: { dwv: Hold; water: Hold };
  let corrections: Correction[];
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    scenario = new HoldScenario(server, world);
  });
  afterAll(() => server?.close());

  const lotId = () => world.lots[0].id;
  const inspector = (): WorldPerson =>
    visit.inspector?.id === world.people.inspector.id ? 'inspector' : 'secondInspector';
  const call = async (person: WorldPerson, path: string, body: object, status = 200) => {
    const answer = await world.as(person).post(path, body);
    expect({ status: answer.status, body: answer.body }).toMatchObject({ status });
    return answer.body;
  };
  const move = async (person: WorldPerson, act: string, parts: object = {}) => {
    visit = (await call(person, `/api/visits/${visit.id}/${act}`, {
      ...scenario.stamp(),
      expectedVersion: visit.version,
      ...parts,
    })) as VisitSummary;
  };
  const request = async (date: string) => {
    const answer = await call(
      'superintendent',
      '/api/visits',
      { lots: [{ lotId: lotId() }], stageCode: 'rough-in', date, label: 'mid' },
      201,
    );
    visit = (answer as { visits: VisitSummary[] }).visits[0] as VisitSummary;
  };
  const plumbing = async () => {
    const [row] = await server.db.query<{ state: string }>('SELECT state FROM clearances WHERE lot_id = :lotId', {
      replacements: { lotId: lotId() },
      type: QueryTypes.SELECT,
    });
    return row?.state ?? 'not-tested';
  };

  it('is asked for, tested and said up', async () => {
    await request('2027-03-03');
    expect(visit).toMatchObject({ state: 'booked', isRetest: false });
    expect(await plumbing()).toBe('not-tested');
    holds = await scenario.standUp(world.lots[0]);
    expect(await plumbing()).toBe('under-test');
    await move('plumber', 'test-up');
    expect(visit.state).toBe('ready');
    expect(await plumbing()).toBe('awaiting-visit');
  });

  it('fails on a leak and on a bare stud', async () => {
    server.clock.set('2027-03-03T16:05:00Z');
    await move(inspector(), 'begin');
    const result = seenResult({
      systems: [
        { unitNumber: 1, system: 'dwv', answer: 'fail', levelIn: 9 },
        { unitNumber: 1, system: 'water', answer: 'pass', needle: 'fell', pressurePsi: 118 },
      ],
      corrections: [
        correctionBody(),
        correctionBody({ subject: 'work', pointCode: 'nail-plates', text: 'Stud without a plate' }),
      ],
    });
    const answer = await call(
      inspector(),
      `/api/visits/${visit.id}/outcome`,
      outcomeBody(scenario, visit.version, result),
    );
    ({ visit, corrections } = answer as { visit: VisitSummary; corrections: Correction[] });
    expect(visit).toMatchObject({ state: 'closed', outcome: { kind: 'fail', reason: null } });
    expect(await plumbing()).toBe('corrections-open');
  });

  it('cannot be asked for again while a correction is open', async () => {
    const body = { lots: [{ lotId: lotId() }], stageCode: 'rough-in', date: '2027-03-04', label: 'mid' };
    expect(await call('superintendent', '/api/visits', body, 409)).toMatchObject({ code: 'corrections-open' });
  });

  it('is put right, tested again and asked for again', async () => {
    await call('plumber', `/api/holds/${holds.dwv.id}/end`, {
      ...scenario.stamp(),
      reason: 'taken-down',
      note: 'to cut out the tee',
    });
    for (const { id, version } of corrections) {
      await call('plumber', `/api/corrections/${id}/fixed`, {
        ...scenario.stamp(),
        expectedVersion: version,
        note: 'put right',
      });
    }
    expect((await scenario.start(world.lots[0], scenario.dwvBody())).ordinal).toBe(2);
    await request('2027-03-04');
    expect(visit).toMatchObject({ state: 'booked', isRetest: true, openCorrections: 0 });
    await move('plumber', 'test-up', { readings: [{ holdId: holds.water.id, ...scenario.pressure(119) }] });
    expect(visit.state).toBe('ready');
  });

  it('is reopened in part: the work again fails alone', async () => {
    server.clock.set('2027-03-04T16:05:00Z');
    await move(inspector(), 'begin');
    const [drain, work] = corrections;
    const result = seenResult({
      accepted: [drain?.id ?? ''],
      reopened: [{ correctionId: work?.id ?? '', why: 'plate on the wrong stud' }],
    });
    const answer = await call(
      inspector(),
      `/api/visits/${visit.id}/outcome`,
      outcomeBody(scenario, visit.version, result),
    );
    ({ visit, corrections } = answer as { visit: VisitSummary; corrections: Correction[] });
    expect(visit.outcome).toEqual({ kind: 'fail', reason: null });
    expect(corrections.map((each) => each.state)).toEqual(['accepted', 'open']);
  });

  it('passes once everything is accepted, and the plumbing is clear', async () => {
    const work = corrections[1];
    await call('plumber', `/api/corrections/${work?.id}/fixed`, {
      ...scenario.stamp(),
      expectedVersion: work?.version,
      note: 'moved',
    });
    await request('2027-03-08');
    await move('plumber', 'test-up');
    server.clock.set('2027-03-08T16:05:00Z');
    await move(inspector(), 'begin');
    const result = seenResult({ accepted: [work?.id ?? ''] });
    const answer = await call(
      inspector(),
      `/api/visits/${visit.id}/outcome`,
      outcomeBody(scenario, visit.version, result),
    );
    expect(answer).toMatchObject({ visit: { state: 'closed', outcome: { kind: 'pass', reason: null } } });
    expect(await plumbing()).toBe('clear');
    const again = { lots: [{ lotId: lotId() }], stageCode: 'rough-in', date: '2027-03-10', label: 'mid' };
    expect(await call('superintendent', '/api/visits', again, 409)).toMatchObject({ code: 'stage-passed' });
  });

  it('left its whole way in the ledger, each act once and in order', async () => {
    const rows = await server.db.query<{ kind: string }>(
      'SELECT kind FROM ledger_entries WHERE lot_id = :lotId ORDER BY sequence',
      {
        replacements: { lotId: lotId() },
        type: QueryTypes.SELECT,
      },
    );
    const told = rows.map((row) => row.kind).filter((kind) => !['plumbing-state', 'visit-requested'].includes(kind));
    expect(told).toEqual([
      ...['visit-booked', 'test-started', 'reading-added', 'test-started', 'reading-added', 'test-up', 'visit-begun'],
      ...['reading-added', 'reading-added', 'outcome', 'correction-opened', 'correction-opened'],
      ...['test-ended', 'correction-fixed', 'correction-fixed', 'test-started', 'reading-added'],
      ...[
        'visit-booked',
        'reading-added',
        'test-up',
        'visit-begun',
        'outcome',
        'correction-accepted',
        'correction-reopened',
      ],
      ...['correction-fixed', 'visit-booked', 'test-up', 'visit-begun', 'outcome', 'correction-accepted'],
    ]);
  });

  it('shows its tests to all three parties and to no other', async () => {
    for (const person of ['superintendent', 'plumber', 'desk'] as const) {
      const list = await world.as(person).get(`/api/lots/${lotId()}/holds`).expect(200);
      expect((list.body.items as Hold[]).map((hold) => `${hold.system} ${hold.ordinal} ${hold.state}`).sort()).toEqual([
        'dwv 1 ended',
        'dwv 2 standing',
        'water 1 standing',
      ]);
    }
    await world.as('otherPlumber').get(`/api/lots/${lotId()}/holds`).expect(404);
  });
});
