import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createLot } from '../testing/fixtures/world.places.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';

let server: TestApp;
let world: World;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  const { builder, plumber, department } = world.organizations;
  const parts = { builder, plumber, department, now: server.clock.now() };
  for (const number of ['10', '11', '100']) await createLot({ ...parts, tract: world.tract, number });
  await createLot({ ...parts, tract: world.tract, number: '10B' }, { address: '10B Quillback Way' });
  await createLot({ ...parts, tract: world.tract, number: 'A-10' }, { address: 'Model home' });
  await createLot({ ...parts, tract: world.tract, number: 'A-9' }, { address: '50% Lane_' });
  await createLot({ ...parts, tract: null, number: '3', plumber: null });
});
afterAll(() => server.close());

const numbersFor = async (person: WorldPerson, query = '') => {
  const { body } = await world.as(person).get(`/api/lots?limit=200&${query}`);
  return (body.items as Array<{ number: string }>).map(({ number }) => number);
};
const inOrder = ['1', '2', '3', '4', '5', '6', '10', '10B', '11', '100', 'A-9', 'A-10', '3'];
const setState = (lotId: string, stageCode: string, state: string) =>
  server.db.query('INSERT INTO clearances VALUES (:lotId, 1, :stageCode, :state, now())', {
    replacements: { lotId, stageCode, state },
  });

describe('the list of lots', () => {
  it('orders numbers as people read them, lots without a tract last, and shows each party its own', async () => {
    expect(await numbersFor('superintendent')).toEqual(inOrder);
    expect(await numbersFor('plumber')).toEqual(inOrder.slice(0, -1));
    expect(await numbersFor('otherDesk')).toEqual(['7']);
    expect(await numbersFor('operator')).toEqual([]);
  });

  it.each([1, 4, 12, 13])('gives every lot once in pages of %i', async (limit) => {
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const { body } = await world
        .as('builderOwner')
        .get(`/api/lots?limit=${limit}${cursor ? `&cursor=${cursor}` : ''}`);
      seen.push(...body.items.map(({ number }: { number: string }) => number));
      cursor = body.nextCursor;
    }
    expect(seen).toEqual(inOrder);
  });

  it('refuses a cursor it did not make', async () => {
    const forged = Buffer.from(JSON.stringify(['0', '', 'x', '1', 'y'])).toString('base64url');
    for (const cursor of ['nonsense', forged]) {
      expect((await world.as('desk').get(`/api/lots?cursor=${cursor}`)).body).toMatchObject({
        code: 'bad-input',
        fields: { cursor: 'not-a-cursor' },
      });
    }
  });

  it('narrows to a tract and to an organization, and a foreign one shows nothing', async () => {
    expect(await numbersFor('superintendent', `tractId=${world.tract.id}`)).toHaveLength(12);
    expect(await numbersFor('superintendent', `organizationId=${world.organizations.plumber.id}`)).toHaveLength(12);
    expect(await numbersFor('superintendent', `tractId=${world.otherTract.id}`)).toEqual([]);
    expect(await numbersFor('superintendent', `organizationId=${world.organizations.otherPlumber.id}`)).toEqual([]);
  });

  it('narrows by the state of a stage, or of the current stage', async () => {
    const [one, two, three] = world.lots;
    for (const stage of ['groundwork', 'rough-in', 'final']) await setState(one.id, stage, 'clear');
    await setState(two.id, 'groundwork', 'clear');
    await setState(two.id, 'rough-in', 'under-test');
    await setState(three.id, 'groundwork', 'corrections-open');
    expect(await numbersFor('desk', 'state=clear')).toEqual(['1']);
    expect(await numbersFor('desk', 'state=under-test')).toEqual(['2']);
    expect(await numbersFor('desk', 'state=corrections-open')).toEqual(['3']);
    expect(await numbersFor('desk', 'state=clear&stage=groundwork')).toEqual(['1', '2']);
    expect(await numbersFor('desk', 'state=not-tested')).toEqual(inOrder.slice(3));
    expect(await numbersFor('desk', 'state=clear&stage=roof')).toEqual([]);
    const { body } = await world.as('desk').get('/api/lots?limit=2');
    expect(body.items).toMatchObject([
      { number: '1', currentStage: null },
      { number: '2', currentStage: 'rough-in' },
    ]);
  });

  it('costs as many statements for many lots as for one', async () => {
    const count = async (limit: number) => {
      const statements: string[] = [];
      server.db.options.logging = (sql) => statements.push(sql);
      await world.as('desk').get(`/api/lots?limit=${limit}`);
      server.db.options.logging = false;
      return statements.length;
    };
    const forOne = await count(1);
    expect(forOne).toBeGreaterThan(0);
    expect(await count(13)).toBe(forOne);
  });
});

describe('finding lots', () => {
  const found = async (person: WorldPerson, q: string) => {
    const { body } = await world.as(person).get(`/api/search?q=${encodeURIComponent(q)}`);
    return (body.items as Array<{ number: string }>).map(({ number }) => number);
  };

  it('finds by number, permit and address, in any case, the best first', async () => {
    expect((await found('plumber', '10')).slice(0, 3)).toEqual(['10', '10B', '100']);
    expect(await found('plumber', 'p-27-0004')).toEqual(['4']);
    expect(await found('plumber', 'model HOME')).toEqual(['A-10']);
    expect(await found('plumber', 'no such street')).toEqual([]);
  });

  it('takes signs of patterns as they are typed', async () => {
    expect(await found('plumber', '%')).toEqual(['A-9']);
    expect(await found('plumber', 'Lane_')).toEqual(['A-9']);
    expect(await found('plumber', "'; DROP TABLE lots; --")).toEqual([]);
    expect(await found('plumber', '\\')).toEqual([]);
  });

  it('gives twelve at most, and never a stranger’s', async () => {
    expect(await found('superintendent', 'Quillback')).toHaveLength(11);
    expect(await found('superintendent', '1')).not.toContain('7');
    expect(await found('otherPlumber', 'Quillback')).toEqual(['7']);
    const { builder } = world.organizations;
    for (let n = 300; n < 315; n += 1)
      await createLot({
        builder,
        plumber: null,
        department: null,
        tract: null,
        number: String(n),
        now: server.clock.now(),
      });
    expect(await found('superintendent', 'Quillback')).toHaveLength(12);
  });

  it('asks for words', async () => {
    expect((await world.as('desk').get('/api/search?q=')).body.code).toBe('bad-input');
  });
});
