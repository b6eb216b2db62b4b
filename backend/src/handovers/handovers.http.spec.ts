import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { HoldScenario } from '../holds/holds.scenario.js';
import type { LotModel } from '../lots/lot.model.js';
import { OutboxWorker } from '../notices/outbox-worker.service.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { addLots, readVisit } from '../testing/fixtures/visits.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';

let server: TestApp;
let world: World;
let scene: HoldScenario;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  scene = new HoldScenario(server, world);
});
afterAll(() => server.close());

const newLot = async (): Promise<LotModel> => (await addLots(server, world, 1))[0] as LotModel;
const askFor = (lot: LotModel, kind: 'plumber' | 'builder' = 'plumber', by: WorldPerson = 'superintendent') => {
  const organizationId = world.organizations[kind === 'plumber' ? 'otherPlumber' : 'otherBuilder'].id;
  return world.as(by).post(`/api/lots/${lot.id}/handovers`, { kind, organizationId });
};
const answer = (
  lot: LotModel,
  body: object,
  by: WorldPerson = 'otherPlumber',
  kind: 'otherPlumber' | 'otherBuilder' = 'otherPlumber',
) =>
  world.as(by).post(`/api/lots/${lot.id}/handovers/answer`, {
    organizationId: world.organizations[kind].id,
    isJoining: true,
    ...body,
  });
const handOver = async (lot: LotModel, body: object = {}) => {
  await askFor(lot).expect(200);
  await answer(lot, body).expect(200);
};
const holdsOf = async (lot: LotModel, by: WorldPerson = 'superintendent') =>
  (await world.as(by).get(`/api/lots/${lot.id}/holds`)).body.items as Array<Record<string, unknown>>;
const askedOf = async (person: WorldPerson, lot: LotModel) =>
  (await world.as(person).get('/api/consents')).body.items.find((each: { lotId: string }) => each.lotId === lot.id);
const ledgerKinds = async (lot: LotModel) => {
  const { body } = await world.as('superintendent').get(`/api/lots/${lot.id}/ledger?limit=200`);
  return body.items.map(({ kind }: { kind: string }) => kind).reverse() as string[];
};
const noticesOf = async (person: WorldPerson, lot: LotModel) => {
  await server.get(OutboxWorker).drain();
  const { body } = await world.as(person).get('/api/notices?limit=200');
  return (body.items as Array<{ lotId: string; kind: string; params: Record<string, unknown> }>).filter(
    ({ lotId }) => lotId === lot.id,
  );
};

// definitions: "replace plumber or builder on the lot: builder's owner or superintendent, with the new one's consent"
describe('asking another to take a lot over', () => {
  it('leaves the present one in place, shows who is asked, and what stands to be taken over', async () => {
    const lot = await newLot();
    const { water } = await scene.standUp(lot);
    const { body } = await askFor(lot, 'plumber', 'builderOwner').expect(200);
    expect(body.handovers).toEqual([
      { kind: 'plumber', organization: expect.objectContaining({ id: world.organizations.otherPlumber.id }) },
    ]);
    expect(body.plumberName).toBe(world.organizations.plumber.name);
    expect((await world.as('otherPlumber').get(`/api/lots/${lot.id}`)).status).toBe(404);
    const asked = await askedOf('otherPlumber', lot);
    expect(asked.handover.replacesName).toBe(world.organizations.plumber.name);
    expect(asked.handover.tests).toContainEqual(
      expect.objectContaining({ holdId: water.id, system: 'water', ordinal: 1, isLevel: false, lastPsi: 120 }),
    );
    expect((await scene.world.as('plumber').post(`/api/holds/${water.id}/readings`, scene.pressure(121))).status).toBe(
      201,
    );
  });

  it.each([
    ['plumber', 403],
    ['desk', 403],
    ['otherSuperintendent', 404],
  ] as const)('is not for the %s: %i', async (person, status) => {
    expect((await askFor(world.lots[0], 'plumber', person)).status).toBe(status);
  });

  it('asks one at a time, another than the present one, and one of that kind', async () => {
    const lot = await newLot();
    const ask = (kind: string, organizationId: string) =>
      world.as('superintendent').post(`/api/lots/${lot.id}/handovers`, { kind, organizationId });
    const { plumber, otherPlumber, otherDepartment } = world.organizations;
    expect((await ask('plumber', plumber.id)).body.code).toBe('party-already-attached');
    expect((await ask('plumber', otherDepartment.id)).body.fields).toEqual({ organizationId: 'unknown' });
    await ask('plumber', otherPlumber.id).expect(200);
    expect((await ask('plumber', otherPlumber.id)).body.code).toBe('party-pending');
    await lot.update({ plumberId: null });
    expect((await ask('plumber', otherPlumber.id)).body.fields).toEqual({ kind: 'none-to-replace' });
  });
});

describe('taking an asking back', () => {
  it('frees the place to ask another, and leaves the one asked nothing to answer', async () => {
    const lot = await newLot();
    const path = `/api/lots/${lot.id}/handovers/plumber`;
    expect((await world.as('superintendent').delete(path)).body.code).toBe('stale-state');
    await askFor(lot).expect(200);
    expect((await world.as('plumber').delete(path)).status).toBe(403);
    expect((await world.as('otherPlumber').delete(path)).status).toBe(404);
    expect((await world.as('builderOwner').delete(path)).body.handovers).toEqual([]);
    expect(await askedOf('otherPlumber', lot)).toBeUndefined();
    expect((await answer(lot, {})).body.code).toBe('stale-state');
    expect(await ledgerKinds(lot)).toEqual(expect.arrayContaining(['handover-asked', 'handover-withdrawn']));
    await askFor(lot).expect(200);
  });
});

describe('answering', () => {
  it('is for those who speak for the one asked, once', async () => {
    const lot = await newLot();
    await askFor(lot).expect(200);
    expect((await answer(lot, {}, 'otherHelper')).status).toBe(403);
    for (const person of ['plumber', 'superintendent', 'otherSuperintendent', 'otherDesk', 'operator'] as const)
      expect((await answer(lot, {}, person)).body).toMatchObject({ code: 'not-found', params: { what: 'lot' } });
    // taking another's place is answered by itself, not among lots that ask in for the first time
    const plain = { organizationId: world.organizations.otherPlumber.id, lotIds: [lot.id], isJoining: true };
    expect((await world.as('otherPlumber').post('/api/consents', plain)).status).toBe(404);
    await answer(lot, {}, 'otherPlumberOwner').expect(200);
    expect((await answer(lot, {})).body).toMatchObject({ code: 'stale-state', params: { is: 'attached' } });
  });

  it('refused, changes nothing but that the builder is told and may ask again', async () => {
    const lot = await newLot();
    await askFor(lot).expect(200);
    await answer(lot, { isJoining: false, why: 'No crew' }).expect(200);
    const { body } = await world.as('plumber').get(`/api/lots/${lot.id}`);
    expect(body).toMatchObject({ plumberName: world.organizations.plumber.name, handovers: [] });
    expect(await noticesOf('superintendent', lot)).toContainEqual(
      expect.objectContaining({ kind: 'consent-refused', params: expect.objectContaining({ why: 'No crew' }) }),
    );
    await askFor(lot).expect(200);
  });

  it('waits while an inspector is at the lot', async () => {
    const lot = await newLot();
    await scene.visit(lot, { state: 'underway' });
    await askFor(lot).expect(200);
    expect((await answer(lot, {})).body.code).toBe('party-has-visit');
    expect((await world.as('plumber').get(`/api/lots/${lot.id}`)).status).toBe(200);
  });
});

// product: "Plumber replaced: a handover act; the old crew loses write but keeps its own evidence; the standing test is ended or taken over"
describe('a plumber replaced', () => {
  it('ends every standing test as handed over, takes test up back, and moves write to the new one', async () => {
    const lot = await newLot();
    const { water } = await scene.standUp(lot);
    const visit = await scene.visit(lot, { state: 'ready' });
    await handOver(lot);
    expect((await holdsOf(lot, 'otherHelper')).map(({ state, endReason }) => [state, endReason])).toEqual([
      ['ended', 'handed-over'],
      ['ended', 'handed-over'],
    ]);
    expect((await readVisit(world, visit.id, 'otherPlumber')).state).toBe('booked');
    for (const person of ['plumber', 'helper', 'plumberOwner'] as const) {
      expect((await world.as(person).get(`/api/lots/${lot.id}`)).status).toBe(404);
      expect((await world.as(person).post(`/api/holds/${water.id}/readings`, scene.pressure(119))).status).toBe(404);
    }
    expect(await ledgerKinds(lot)).toEqual(
      expect.arrayContaining(['handover-asked', 'test-ended', 'no-longer-up', 'party-replaced']),
    );
  });

  it('takes a test over as a new one, linked to the old, with a fresh reading first', async () => {
    const lot = await newLot();
    const { dwv, water } = await scene.standUp(lot);
    await askFor(lot).expect(200);
    server.clock.advance(10);
    await answer(lot, { takeOver: [{ holdId: water.id, reading: scene.pressure(118) }] }).expect(200);
    const holds = await holdsOf(lot, 'otherPlumber');
    const taken = holds.find(({ state }) => state === 'standing');
    expect(taken).toMatchObject({
      system: 'water',
      ordinal: 2,
      method: 'gauge',
      gauge: { rangePsi: 200, incrementPsi: 2 },
    });
    expect((taken?.readings as object[]).length).toBe(1);
    expect(taken?.readings).toMatchObject([
      { pressurePsi: 118, byRole: 'plumber', byName: world.people.otherPlumber.name },
    ]);
    const [rows] = await server.db.query(
      `SELECT supersedes_id AS "from", plumber_id AS "plumberId" FROM holds WHERE id = '${String(taken?.id)}'`,
    );
    expect(rows).toEqual([{ from: water.id, plumberId: world.organizations.otherPlumber.id }]);
    expect(holds.find(({ id }) => id === dwv.id)).toMatchObject({ state: 'ended', endReason: 'handed-over' });
    await world
      .as('otherPlumber')
      .post(`/api/holds/${String(taken?.id)}/readings`, scene.pressure(117))
      .expect(201);
  });

  it('is refused whole where a test cannot be taken over as said', async () => {
    const lot = await newLot();
    const { water } = await scene.standUp(lot);
    const old = scene.pressure(118);
    server.clock.advance(5);
    await askFor(lot).expect(200);
    const fresh = () => scene.pressure(118);
    const refused = async (takeOver: object[], by: WorldPerson = 'otherPlumber') =>
      (await answer(lot, { takeOver }, by)).body;
    expect((await refused([{ holdId: randomUUID(), reading: fresh() }])).fields).toEqual({
      'takeOver.0.holdId': 'not-standing',
    });
    expect((await refused([{ holdId: water.id, reading: old }])).fields).toEqual({
      'takeOver.0.reading.madeAt': 'before-the-asking',
    });
    expect((await refused([{ holdId: water.id, reading: scene.level(2) }])).fields).toMatchObject({
      'takeOver.0.reading.pressurePsi': 'required',
    });
    expect((await refused([{ holdId: water.id, reading: fresh() }], 'otherPlumberOwner')).code).toBe('not-allowed');
    expect((await holdsOf(lot, 'plumber')).map(({ state }) => state)).toEqual(['standing', 'standing']);
  });

  it('is told to both plumbers and the department', async () => {
    const lot = await newLot();
    await handOver(lot);
    const told = { former: world.organizations.plumber.name, new: world.organizations.otherPlumber.name };
    for (const person of ['plumber', 'plumberOwner', 'superintendent', 'desk'] as const) {
      expect(await noticesOf(person, lot)).toContainEqual(
        expect.objectContaining({
          kind: 'handover',
          params: expect.objectContaining({ formerName: told.former, organizationName: told.new }),
        }),
      );
    }
    expect((await noticesOf('plumber', lot))[0]?.params.hasLeft).toBe(true);
    expect((await noticesOf('desk', lot))[0]?.params.hasLeft).toBeUndefined();
  });

  it('lets the old one read its evidence and the ledger up to then, and nothing later', async () => {
    const lot = await newLot();
    const { water } = await scene.standUp(lot);
    await askFor(lot).expect(200);
    server.clock.advance(10);
    await answer(lot, { takeOver: [{ holdId: water.id, reading: scene.pressure(118) }] }).expect(200);
    server.clock.advance(10);
    await world.as('superintendent').patch(`/api/lots/${lot.id}`, { address: '9 Later Lane' }).expect(200);

    const mine = (await world.as('helper').get('/api/past-lots')).body.items;
    expect(mine[0]).toMatchObject({
      lotId: lot.id,
      kind: 'plumber',
      replacedByName: world.organizations.otherPlumber.name,
    });
    const past = (await world.as('plumber').get(`/api/past-lots/${lot.id}`)).body;
    expect(past.address).toBe(lot.address);
    expect(
      past.holds.map(({ ordinal, endReason }: { ordinal: number; endReason: string }) => [ordinal, endReason]),
    ).toEqual([
      [1, 'handed-over'],
      [1, 'handed-over'],
    ]);
    const page = (await world.as('plumber').get(`/api/past-lots/${lot.id}/ledger?limit=200`)).body;
    expect(page.items[0].kind).toBe('party-replaced');
    expect(page.total).toBe(page.items.length);
    const whole = await ledgerKinds(lot);
    expect(whole.slice(page.total)).toEqual(expect.arrayContaining(['test-started', 'reading-added', 'lot-changed']));
  });

  it('shows a past lot to nobody else', async () => {
    const lot = await newLot();
    await handOver(lot);
    for (const person of ['otherPlumber', 'superintendent', 'desk', 'otherSuperintendent', 'operator'] as const) {
      for (const path of [`/api/past-lots/${lot.id}`, `/api/past-lots/${lot.id}/ledger`])
        expect((await world.as(person).get(path)).body).toMatchObject({ code: 'not-found', params: { what: 'lot' } });
    }
    expect((await world.as('superintendent').get('/api/past-lots')).body.items).toEqual([]);
  });

  it('lets one of two answers at once go through', async () => {
    const lot = await newLot();
    await scene.standUp(lot);
    await askFor(lot).expect(200);
    const answers = await Promise.all([answer(lot, {}), answer(lot, { isJoining: false }, 'otherPlumberOwner')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('keeps what was written in the database: the application cannot change a past party (SQLSTATE 42501)', async () => {
    await expect(server.db.query('UPDATE lot_past_parties SET until_sequence = 1')).rejects.toMatchObject({
      original: { code: '42501' },
    });
  });
});

describe('a builder replaced', () => {
  it('moves the lot with its tests standing, and keeps the old one its reading', async () => {
    const lot = await newLot();
    const { water } = await scene.standUp(lot);
    await askFor(lot, 'builder').expect(200);
    expect((await askedOf('otherSuperintendent', lot)).handover).toEqual({
      replacesName: world.organizations.builder.name,
      tests: [],
    });
    await answer(lot, {}, 'otherSuperintendent', 'otherBuilder').expect(200);
    const { body } = await world.as('otherSuperintendent').get(`/api/lots/${lot.id}`);
    expect(body).toMatchObject({ builderName: world.organizations.otherBuilder.name, number: lot.number });
    expect(body.tract.name).toBe('Quillback Rise');
    expect(body.abilities.canEdit).toBe(true);
    expect((await world.as('superintendent').get(`/api/lots/${lot.id}`)).status).toBe(404);
    await world.as('plumber').post(`/api/holds/${water.id}/readings`, scene.pressure(90)).expect(201);
    const past = (await world.as('superintendent').get(`/api/past-lots/${lot.id}`)).body;
    expect(past.holds.map(({ state }: { state: string }) => state)).toEqual(['standing', 'standing']);
    const shown = past.holds.find(({ id }: { id: string }) => id === water.id);
    expect(shown.readings.map(({ pressurePsi }: { pressurePsi: number }) => pressurePsi)).toEqual([120]);
  });
});
