import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AccessCheck } from '@holdwater/backend/common/access/access.check.js';
import { createWorld, type World, type WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { startTestApp, type TestApp } from '@holdwater/backend/testing/test-app.js';
import { matrix, type MatrixRow } from './matrix.routes.js';
import { makeThings, type Things } from './things.js';

/** A route that lets a person through answers by its own rules; what it never says to them is: not you. */
const refusals = [401, 403, 404];

describe('every route, as every role of the own and of another organization', () => {
  let server: TestApp;
  let world: World;
  let things: Things;
  let everyone: WorldPerson[];

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    things = await makeThings(server, world);
    everyone = Object.keys(world.people) as WorldPerson[];
  });
  afterAll(() => server?.close());

  const call = async (route: string, row: MatrixRow, person: WorldPerson | null): Promise<number> => {
    const [method = '', pattern = ''] = route.split(' ');
    const caller = person ? world.as(person) : world.nobody();
    const path = row.path?.(things) ?? pattern;
    const answer =
      method === 'GET'
        ? await caller.get(path)
        : await caller[method.toLowerCase() as 'post'](path, row.body?.(things) ?? {});
    return answer.status;
  };

  it('knows every route there is, and no other', () => {
    const served = server
      .get(AccessCheck)
      .routes()
      .map(({ method, path }) => `${method} ${path}`);
    expect(Object.keys(matrix).sort()).toEqual(served.sort());
  });

  it.each(Object.entries(matrix).filter(([, row]) => row.may !== 'anyone'))(
    '%s asks for a sign-in',
    async (route, row) => {
      expect(await call(route, row, null)).toBe(401);
    },
  );

  it.each(Object.entries(matrix).filter(([, row]) => row.may === 'anyone' && !row.body))(
    '%s is open to anyone',
    async (route, row) => {
      // without its cookie a refresh is refused by its own rule
      const expected = route === 'POST /api/auth/refresh' ? 401 : 200;
      expect(await call(route, row, null)).toBe(expected);
    },
  );

  it.each(Object.entries(matrix).filter(([, row]) => Array.isArray(row.may)))(
    '%s refuses whoever may not',
    async (route, row) => {
      const let_through: string[] = [];
      for (const person of everyone.filter((each) => !row.may.includes(each))) {
        const status = await call(route, row, person);
        if (status !== 404 && status !== 403) let_through.push(`${person}: ${status}`);
      }
      expect(let_through).toEqual([]);
    },
  );

  it.each(Object.entries(matrix).filter(([, row]) => Array.isArray(row.may) && !row.isPublicThing))(
    '%s hides from people of other lots that it is there',
    async (route, row) => {
      for (const person of ['otherSuperintendent', 'otherPlumber', 'otherDesk', 'otherInspector'] as const) {
        expect(await call(route, row, person)).toBe(404);
      }
    },
  );

  it.each(Object.entries(matrix).filter(([, row]) => row.may !== 'anyone'))(
    '%s lets through whoever may',
    async (route, row) => {
      const may = row.may === 'signed-in' ? everyone : (row.may as readonly WorldPerson[]);
      const refused: string[] = [];
      for (const person of may) {
        const status = await call(route, row, person);
        // each takes or consumes the one thing there is: what is gone by then is gone by right
        const isGone = status === 404 && person !== may[0];
        if (refusals.includes(status) && !isGone) refused.push(`${person}: ${status}`);
      }
      expect(refused).toEqual([]);
    },
  );
});
