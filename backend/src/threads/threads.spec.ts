import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';

describe("a lot's thread", () => {
  let server: TestApp;
  let world: World;
  let path: string;
  const said = (text: string, more: object = {}) => ({ clientId: randomUUID(), madeAt: testNow, text, ...more });

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    path = `/api/lots/${world.lots[0].id}/comments`;
  });
  afterAll(() => server?.close());

  it('keeps what each of the three parties says, newest first', async () => {
    for (const person of ['superintendent', 'plumber', 'helper', 'inspector', 'desk'] as const) {
      const answer = await world.as(person).post(path, said(`from ${person}`));
      expect(answer.status).toBe(201);
      expect(answer.body).toMatchObject({ text: `from ${person}`, authorRole: person });
    }
    const page = await world.as('superintendent').get(`${path}?limit=2`);
    expect(page.body.items).toHaveLength(2);
    const rest = await world.as('superintendent').get(`${path}?limit=10&cursor=${page.body.nextCursor}`);
    expect(rest.body.items).toHaveLength(3);
    expect(rest.body.nextCursor).toBeNull();
  });

  it('keeps script as the text it is', async () => {
    const text = '<script>alert(1)</script> & <b>so</b>';
    expect((await world.as('plumber').post(path, said(text))).body.text).toBe(text);
  });

  it('answers a repeated client id with the comment that is there', async () => {
    const once = said('only once');
    const first = await world.as('plumber').post(path, once);
    const again = await world.as('plumber').post(path, once);
    expect(again.status).toBe(201);
    expect(again.body.id).toBe(first.body.id);
  });

  it('gives the first answer again for the same key, and refuses the key for other words', async () => {
    const key = randomUUID();
    const body = said('keyed');
    const first = await world.as('plumber').post(path, body, { key });
    const again = await world.as('plumber').post(path, body, { key });
    expect(again.body).toEqual(first.body);
    const other = await world.as('plumber').post(path, said('other words'), { key });
    expect(other.status).toBe(409);
    expect(other.body.code).toBe('idempotency-key-reused');
  });

  it('refuses empty words, words past the limit, and ten megabytes, and writes nothing', async () => {
    const before = (await world.as('plumber').get(`${path}?limit=200`)).body.items.length;
    expect((await world.as('plumber').post(path, said('   '))).body).toMatchObject({
      code: 'bad-input',
      fields: { text: 'required' },
    });
    expect((await world.as('plumber').post(path, said('x'.repeat(4001)))).body).toMatchObject({
      code: 'bad-input',
      fields: { text: 'too-long' },
    });
    const huge = await world.as('plumber').post(path, said('x'.repeat(10_000_000)));
    expect([huge.status, huge.body.code]).toEqual([413, 'too-large']);
    expect((await world.as('plumber').get(`${path}?limit=200`)).body.items).toHaveLength(before);
  });

  it('is not there for people of other lots, for owners only to read, for nobody without a sign-in', async () => {
    for (const person of ['otherSuperintendent', 'otherPlumber', 'otherDesk', 'operator'] as const) {
      expect((await world.as(person).get(path)).status).toBe(404);
      expect((await world.as(person).post(path, said('hello'))).status).toBe(404);
    }
    expect((await world.as('builderOwner').get(path)).status).toBe(200);
    expect((await world.as('builderOwner').post(path, said('hello'))).status).toBe(403);
    expect((await world.nobody().get(path)).status).toBe(401);
  });

  it('hangs on a thing of its own lot only', async () => {
    const answer = await world.as('plumber').post(path, said('on what', { on: { kind: 'visit', id: randomUUID() } }));
    expect(answer.status).toBe(404);
  });
});
