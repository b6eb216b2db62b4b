import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { book, standTest } from '../../testing/fixtures/visits.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';

let server: TestApp;
let world: World;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server.close());

describe('a 404 names the thing, alike for what is missing, what is no address and what is of other people', () => {
  const refusalOf = async (path: string) => {
    const { status, body } = await world.as('otherSuperintendent').get(path);
    expect(status).toBe(404);
    return { code: body.code, params: body.params };
  };

  it('says lot and visit', async () => {
    const visit = await book(world, world.lots[0]);
    for (const id of [world.lots[0].id, randomUUID(), 'no-id'])
      for (const rest of ['', '/holds', '/ledger'])
        expect(await refusalOf(`/api/lots/${id}${rest}`)).toEqual({ code: 'not-found', params: { what: 'lot' } });
    for (const id of [visit.id, randomUUID()])
      expect(await refusalOf(`/api/visits/${id}`)).toEqual({ code: 'not-found', params: { what: 'visit' } });
  });

  it('says test of a foreign test, though its lot is what hides it', async () => {
    const hold = await standTest(server, world, world.lots[1], 'water');
    const body = {
      clientId: randomUUID(),
      madeAt: server.clock.now().toISOString(),
      pressurePsi: 100,
      gaugeValve: 'open',
    };
    for (const id of [hold.id, randomUUID()]) {
      const answer = await world.as('otherPlumber').post(`/api/holds/${id}/readings`, body);
      expect(answer.body).toMatchObject({ code: 'not-found', params: { what: 'test' } });
    }
  });

  it('says lot where the body names it', async () => {
    for (const lotId of [world.lots[0].id, randomUUID()]) {
      const wish = { lots: [{ lotId }], stageCode: 'rough-in', date: '2027-03-09', label: 'mid' };
      const answer = await world.as('otherSuperintendent').post('/api/visits', wish);
      expect(answer.body).toMatchObject({ code: 'not-found', params: { what: 'lot' } });
    }
  });

  it('says unit to whoever may know the lot', async () => {
    const house = (await world.as('superintendent').get(`/api/lots/${world.lots[0].id}`)).body.units[0].geometry;
    const answer = await world
      .as('superintendent')
      .put(`/api/lots/${world.lots[0].id}/units/9/geometry`, { geometry: house });
    expect(answer.body).toMatchObject({ code: 'not-found', params: { what: 'unit' } });
  });

  it('names nothing where a page alone is missing', async () => {
    expect(await refusalOf('/api/nowhere')).toEqual({ code: 'not-found', params: undefined });
  });
});
