import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { house } from '../../testing/fixtures/house.js';
import { createWorld, type World, type WorldPerson } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';
import { LotUnitModel } from '../lot-unit.model.js';

let server: TestApp;
let world: World;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server.close());
beforeEach(async () => {
  await server.db.query('UPDATE lot_units SET house_model_id = NULL, house_model_version = NULL, geometry = NULL');
});

const root = '/api/house-models';
const save = (name: string, geometry: object = house(), person: WorldPerson = 'superintendent') =>
  world.as(person).post(root, { builderId: world.organizations.builder.id, name, geometry });
const saved = async (name: string, geometry?: object) => (await save(name, geometry)).body as { id: string };
const unit = (lot: number, whenChanged?: string, unitNumber = 1) => ({
  ...{ lotId: world.lots[lot]?.id, unitNumber },
  ...(whenChanged && { whenChanged }),
});
const apply = (id: string, units: object[], expectedVersion = 1, person: WorldPerson = 'superintendent') =>
  world.as(person).post(`${root}/${id}/apply`, { expectedVersion, units });
const read = async (id: string) => (await world.as('superintendent').get(`${root}/${id}`)).body;
const unitOf = async (lot: number, person: WorldPerson = 'superintendent') =>
  (await world.as(person).get(`/api/lots/${world.lots[lot]?.id}`)).body.units[0];
const put = (lot: number, geometry: object, person: WorldPerson = 'plumber') =>
  world.as(person).put(`/api/lots/${world.lots[lot]?.id}/units/1/geometry`, { geometry });
const versionOf = (id: string, geometry: object, expectedVersion = 1) =>
  world.as('superintendent').post(`${root}/${id}/versions`, { expectedVersion, geometry });
const lastEntry = async (where: string) => {
  const [rows] = await server.db.query(
    `SELECT kind, actor_role, payload FROM ledger_entries WHERE ${where} ORDER BY at DESC, sequence DESC LIMIT 1`,
  );
  return rows[0] as { kind: string; actor_role: string; payload: Record<string, unknown> };
};

describe('a house model', () => {
  it.each(['superintendent', 'builderOwner'] as const)('is saved under its name by the %s', async (person) => {
    const { status, body } = await save(`Plan ${person}`, house(), person);
    expect(status).toBe(201);
    expect(body).toMatchObject({ name: `Plan ${person}`, version: 1, geometry: house(), units: [] });
    expect(body.abilities).toEqual({ canWrite: true, canApply: person === 'superintendent' });
    expect(await lastEntry(`scope = 'organization:${world.organizations.builder.id}'`)).toMatchObject({
      kind: 'house-model-added',
      payload: { modelId: body.id, name: `Plan ${person}` },
    });
  });

  it.each([
    ['plumber', 'not-found'],
    ['desk', 'not-found'],
    ['otherSuperintendent', 'not-found'],
    ['operator', 'not-found'],
  ] as const)('is not for the %s to save, read, list or give (%s)', async (person, code) => {
    const { id } = await saved(`Hidden from ${person}`);
    const answers = [
      await save('Elsewhere', house(), person),
      await world.as(person).get(`${root}/${id}`),
      await world.as(person).get(`${root}?builderId=${world.organizations.builder.id}`),
      await world.as(person).get(`${root}/${id}/units?tractId=none`),
      await apply(id, [unit(0)], 1, person),
      await world.as(person).delete(`${root}/${id}`),
    ];
    expect(answers.map(({ body }) => body.code)).toEqual(answers.map(() => code));
  });

  it('has its name once a builder, in whatever case', async () => {
    await saved('Plan 1480');
    const again = await save('plan 1480');
    expect([again.status, again.body.code]).toEqual([409, 'house-model-name-taken']);
    expect(again.body.fields).toEqual({ name: 'taken' });
    const other = await saved('Plan 1481');
    const renamed = await world.as('builderOwner').patch(`${root}/${other.id}`, { name: 'PLAN 1480' });
    expect(renamed.body.code).toBe('house-model-name-taken');
    const elsewhere = { builderId: world.organizations.otherBuilder.id, name: 'Plan 1480', geometry: house() };
    expect((await world.as('otherSuperintendent').post(root, elsewhere)).status).toBe(201);
  });

  it('is renamed, and its lots say the new name', async () => {
    const { id } = await saved('Old name');
    await apply(id, [unit(0)]);
    const { body } = await world.as('builderOwner').patch(`${root}/${id}`, { name: 'New name' });
    expect(body).toMatchObject({ name: 'New name', version: 1 });
    expect((await unitOf(0)).model).toMatchObject({ name: 'New name', version: 1, changes: [] });
    expect(await lastEntry(`scope = 'organization:${world.organizations.builder.id}'`)).toMatchObject({
      ...{ kind: 'house-model-renamed', actor_role: 'owner' },
      payload: { name: 'New name', formerName: 'Old name' },
    });
  });

  it.each<[string, object, Record<string, string>]>([
    ['the highest fitting above the vent', { highestFittingFt: 25 }, { highestFittingFt: 'level-above-vent-terminal' }],
    ['a cut above the roof', { atticCutFt: 25 }, { atticCutFt: 'level-above-vent-terminal' }],
    ['a rating of zero', { lowestRatedPsi: 0 }, { lowestRatedPsi: 'must-be-positive' }],
    [
      'a plug with no size',
      { plugs: [{ name: 'drain', elevationFt: -2, ratedPsi: 17 }] },
      { 'plugs.0.nominalIn': 'size-missing' },
    ],
    [
      'floors out of order',
      {
        floors: [
          { name: 'second', elevationFt: 10 },
          { name: 'first', elevationFt: 0 },
        ],
      },
      { 'floors.1.elevationFt': 'floor-out-of-order' },
    ],
  ])('cannot have %s; nor can a lot', async (_what, wrong, expected) => {
    const fields = Object.fromEntries(Object.entries(expected).map(([path, code]) => [`geometry.${path}`, code]));
    const refused = await save('Impossible', { ...house(), ...wrong });
    expect([refused.status, refused.body.code]).toEqual([400, 'bad-input']);
    expect(refused.body.fields).toMatchObject(fields);
    expect((await put(0, { ...house(), ...wrong })).body.fields).toMatchObject(fields);
    const { id } = await saved(`Possible ${randomUUID()}`);
    expect((await versionOf(id, { ...house(), ...wrong })).body.fields).toMatchObject(fields);
  });
});

describe('giving a model to lots', () => {
  it('is one act that tells how many, and writes on each lot', async () => {
    const { id } = await saved('Plan 2210');
    const { status, body } = await apply(id, [unit(0), unit(1), unit(2)]);
    expect([status, body]).toEqual([200, { units: 3, lots: 3, alreadySo: 0 }]);
    for (const lot of [0, 1, 2]) {
      expect(await unitOf(lot, 'plumber')).toMatchObject({
        geometry: house(),
        model: { id, name: 'Plan 2210', version: 1, newestVersion: 1, changes: [] },
      });
      expect(await lastEntry(`lot_id = '${world.lots[lot]?.id}'`)).toMatchObject({
        ...{ kind: 'house-applied', actor_role: 'superintendent' },
        payload: { unitNumber: 1, modelId: id, name: 'Plan 2210', version: 1, keptChanges: [] },
      });
    }
    expect((await apply(id, [unit(0), unit(3)])).body).toEqual({ units: 1, lots: 1, alreadySo: 1 });
    expect((await read(id)).use).toEqual({ units: 4, lots: 4, changed: 0, behind: 0 });
  });

  it('is done once for a repeated request', async () => {
    const { id } = await saved('Sent twice');
    const body = { expectedVersion: 1, units: [unit(0)] };
    const key = randomUUID();
    const send = () => world.as('superintendent').post(`${root}/${id}/apply`, body, { key });
    expect([(await send()).body, (await send()).body]).toEqual([
      { units: 1, lots: 1, alreadySo: 0 },
      { units: 1, lots: 1, alreadySo: 0 },
    ]);
  });

  it('names houses measured or changed on their lot, and does nothing before they are asked about', async () => {
    const { id } = await saved('Asked first');
    await put(0, { ...house(), ventTerminalFt: 25 });
    await apply(id, [unit(1)]);
    await put(1, { ...house(), atticCutFt: 21 });
    const refused = await apply(id, [unit(0), unit(1), unit(2)]);
    expect([refused.status, refused.body.code]).toEqual([409, 'houses-changed-by-hand']);
    expect(refused.body.params).toMatchObject({
      count: 2,
      units: [
        { lotId: world.lots[0].id, lotNumber: '1', unitNumber: 1 },
        { lotId: world.lots[1].id, lotNumber: '2', unitNumber: 1 },
      ],
    });
    expect((await unitOf(2)).geometry).toBeNull();
    expect((await unitOf(1)).model).toMatchObject({ changes: ['atticCutFt'] });
    // one measured on its own has no changes to carry over
    expect((await apply(id, [unit(0, 'keep-changes')])).body.code).toBe('houses-changed-by-hand');
    const done = await apply(id, [unit(0, 'replace'), unit(1, 'replace'), unit(2)]);
    expect(done.body).toEqual({ units: 3, lots: 3, alreadySo: 0 });
    expect((await unitOf(1)).model.changes).toEqual([]);
  });

  it('leaves lots at their version until the newest is given, and carries their own changes over', async () => {
    const { id } = await saved('Versioned');
    await apply(id, [unit(0), unit(1)]);
    await put(1, { ...house(), atticCutFt: 21, lowestRatedPsi: 150 });
    const next = { ...house(), highestOutletFt: 16, atticCutFt: 20.5 };
    expect((await versionOf(id, next)).body).toMatchObject({
      version: 2,
      versions: [{ version: 2 }, { version: 1 }],
      use: { units: 2, lots: 2, changed: 1, behind: 2 },
    });
    expect((await unitOf(0)).model).toMatchObject({ version: 1, newestVersion: 2, changes: [] });
    const offered = await world.as('superintendent').get(`${root}/${id}/units?tractId=${world.tract.id}`);
    expect(offered.body.items.slice(0, 3)).toMatchObject([
      { lotNumber: '1', isByHand: false, isSame: false, canKeepChanges: false },
      { lotNumber: '2', isByHand: true, isSame: false, canKeepChanges: true },
      { lotNumber: '3', isMeasured: false, isByHand: false, origin: null },
    ]);
    expect((await apply(id, [unit(0), unit(1, 'keep-changes')], 2)).body).toMatchObject({ units: 2 });
    expect(await unitOf(0)).toMatchObject({ geometry: next, model: { version: 2, changes: [] } });
    expect(await unitOf(1)).toMatchObject({
      geometry: { ...next, atticCutFt: 21, lowestRatedPsi: 150 },
      model: { version: 2, changes: ['atticCutFt', 'lowestRatedPsi'] },
    });
    expect(await lastEntry(`lot_id = '${world.lots[1].id}'`)).toMatchObject({
      payload: { version: 2, keptChanges: ['atticCutFt', 'lowestRatedPsi'] },
    });
  });

  it('refuses changes carried over that do not fit the version, naming the lot', async () => {
    const { id } = await saved('Lowered');
    await apply(id, [unit(0), unit(1)]);
    await put(0, { ...house(), atticCutFt: 23 });
    await versionOf(id, { ...house(), ventTerminalFt: 22, pipes: [] });
    const refused = await apply(id, [unit(1), unit(0, 'keep-changes')], 2);
    expect([refused.status, refused.body.code]).toEqual([409, 'house-cannot-be']);
    expect(refused.body.params).toMatchObject({ lotNumber: '1' });
    expect((await unitOf(1)).model.version).toBe(1);
  });

  it('refuses the version looked at when another was made, and makes none for the same house', async () => {
    const { id } = await saved('Raced');
    expect((await versionOf(id, house())).body.version).toBe(1);
    await versionOf(id, { ...house(), supplyPsi: 70 });
    expect((await versionOf(id, { ...house(), supplyPsi: 71 })).body.code).toBe('stale-state');
    expect((await apply(id, [unit(0)], 1)).body.code).toBe('stale-state');
  });

  it('refuses the owner, a lot of another builder, a unit that is not there and one named twice', async () => {
    const { id } = await saved('Refused');
    expect((await apply(id, [unit(0)], 1, 'builderOwner')).body.code).toBe('not-allowed');
    const foreign = await apply(id, [{ lotId: world.otherLot.id, unitNumber: 1 }]);
    expect(foreign.body).toMatchObject({ code: 'not-found' });
    expect((await apply(id, [unit(0, 'ask', 2)])).body).toMatchObject({
      ...{ code: 'not-found', params: { what: 'unit' } },
    });
    expect((await apply(id, [unit(0), unit(0)])).body.fields).toEqual({ 'units.1': 'named-twice' });
    expect((await apply(id, [])).body.fields).toEqual({ units: 'required' });
  });

  it('keeps two units of one house apart', async () => {
    const [lot, id] = [world.lots[4], (await saved('Two units')).id];
    await LotUnitModel.create({ id: randomUUID(), lotId: lot.id, number: 2, label: 'B', geometry: null });
    expect((await apply(id, [unit(4), unit(4, 'ask', 2)])).body).toEqual({ units: 2, lots: 1, alreadySo: 0 });
    await put(4, { ...house(), supplyPsi: 80 });
    const { units } = (await world.as('superintendent').get(`/api/lots/${lot.id}`)).body;
    expect(units.map((one: { model: { changes: string[] } }) => one.model.changes)).toEqual([['supplyPsi'], []]);
  });
});

describe('removing a model', () => {
  it('is refused while a lot uses it', async () => {
    const { id } = await saved('Used');
    await apply(id, [unit(0), unit(1)]);
    const refused = await world.as('superintendent').delete(`${root}/${id}`);
    expect([refused.status, refused.body.code, refused.body.params]).toEqual([409, 'house-model-in-use', { count: 2 }]);
  });

  it('leaves no trace but the entry in the record', async () => {
    const { id } = await saved('Unused');
    await versionOf(id, { ...house(), supplyPsi: 70 });
    expect((await world.as('builderOwner').delete(`${root}/${id}`)).body).toEqual({ done: true });
    expect((await world.as('builderOwner').get(`${root}/${id}`)).body).toMatchObject({
      ...{ code: 'not-found', params: { what: 'house-model' } },
    });
    expect(await lastEntry(`scope = 'organization:${world.organizations.builder.id}'`)).toMatchObject({
      ...{ kind: 'house-model-removed', payload: { name: 'Unused' } },
    });
  });

  it('lets go of lots that went to another builder, whose houses stay', async () => {
    const { id } = await saved('Handed over');
    await apply(id, [unit(5)]);
    const moved = { replacements: { id: world.lots[5].id, builderId: world.organizations.otherBuilder.id } };
    await server.db.query('UPDATE lots SET builder_id = :builderId, tract_id = NULL WHERE id = :id', moved);
    expect(await unitOf(5, 'plumber')).toMatchObject({ geometry: house(), model: null });
    expect((await apply(id, [unit(5, 'replace')])).body).toMatchObject({ code: 'not-found' });
    expect((await world.as('superintendent').delete(`${root}/${id}`)).body).toEqual({ done: true });
    expect(await unitOf(5, 'plumber')).toMatchObject({ geometry: house() });
  });
});

describe('a version', () => {
  it('is never edited, by anyone', async () => {
    const { id } = await saved('Guarded');
    const edit = server.db.query('UPDATE house_model_versions SET geometry = :geometry WHERE model_id = :id', {
      replacements: { id, geometry: '{}' },
    });
    await expect(edit).rejects.toThrow('never edited');
  });
});
