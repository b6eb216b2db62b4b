import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';

let server: TestApp;
let world: World;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server.close());

const plat = {
  ...{ widthFt: 600, heightFt: 400, northDegrees: 12 },
  parcels: [
    {
      lotNumber: '1',
      points: [
        [0, 0],
        [60, 0],
        [60, 110],
        [0, 110],
      ],
    },
  ],
  roads: [
    {
      name: 'Quillback Way',
      points: [
        [0, 130],
        [600, 130],
      ],
      widthFt: 32,
    },
  ],
};
const namesFor = async (person: WorldPerson) =>
  ((await world.as(person).get('/api/tracts')).body.items as Array<{ name: string; lotCount: number }>).map(
    ({ name, lotCount }) => [name, lotCount],
  );

describe('tracts', () => {
  it('are listed to those with a lot in them, and empty ones to their own builder', async () => {
    const added = await world
      .as('superintendent')
      .post('/api/tracts', { builderId: world.organizations.builder.id, name: 'Heron Bench', plat });
    expect(added.status).toBe(201);
    expect(added.body).toMatchObject({ name: 'Heron Bench', builderName: 'Odderly Homes', lotCount: 0, plat });
    expect(await namesFor('builderOwner')).toEqual([
      ['Heron Bench', 0],
      ['Quillback Rise', 6],
    ]);
    expect(await namesFor('plumber')).toEqual([['Quillback Rise', 6]]);
    expect(await namesFor('otherDesk')).toEqual([['Sedge Hollow', 1]]);
    expect(await namesFor('operator')).toEqual([]);
  });

  it('counts only the lots the reader may see', async () => {
    await server.db.query('UPDATE lots SET plumber_id = NULL WHERE id = :id', {
      replacements: { id: world.lots[5].id },
    });
    expect(await namesFor('plumber')).toEqual([['Quillback Rise', 5]]);
  });

  it('are renamed and drawn anew, or their drawing taken away', async () => {
    const path = `/api/tracts/${world.tract.id}`;
    expect((await world.as('superintendent').patch(path, { plat })).body.plat).toEqual(plat);
    const { body } = await world.as('superintendent').patch(path, { name: 'Quillback Ridge', plat: null });
    expect(body).toMatchObject({ name: 'Quillback Ridge', plat: null });
    const [rows] = await server.db.query(
      `SELECT kind, payload FROM ledger_entries WHERE kind LIKE 'tract-%' ORDER BY sequence`,
    );
    expect(rows).toMatchObject([
      { kind: 'tract-added', payload: { name: 'Heron Bench' } },
      { kind: 'tract-changed', payload: { fields: ['plat'] } },
      { kind: 'tract-changed', payload: { name: 'Quillback Ridge', fields: ['name', 'plat'] } },
    ]);
  });

  it('have each name once a builder', async () => {
    const again = { builderId: world.organizations.builder.id, name: 'Heron Bench' };
    expect((await world.as('superintendent').post('/api/tracts', again)).body).toMatchObject({
      code: 'tract-name-taken',
      fields: { name: 'taken' },
    });
    expect(
      (await world.as('superintendent').patch(`/api/tracts/${world.tract.id}`, { name: 'Heron Bench' })).body.code,
    ).toBe('tract-name-taken');
    const elsewhere = { ...again, builderId: world.organizations.otherBuilder.id };
    expect((await world.as('otherSuperintendent').post('/api/tracts', elsewhere)).status).toBe(201);
  });

  it.each([
    ['builderOwner', 'not-allowed', 'not-allowed'],
    ['plumber', 'not-found', 'not-allowed'],
    ['desk', 'not-found', 'not-allowed'],
    ['otherSuperintendent', 'not-found', 'not-found'],
    ['operator', 'not-found', 'not-found'],
  ] as const)('are not for the %s to add (%s) or change (%s)', async (person, adding, changing) => {
    const given = { builderId: world.organizations.builder.id, name: 'Elsewhere' };
    expect((await world.as(person).post('/api/tracts', given)).body.code).toBe(adding);
    expect((await world.as(person).patch(`/api/tracts/${world.tract.id}`, { name: 'Elsewhere' })).body.code).toBe(
      changing,
    );
  });
});
