import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';
import { LedgerVerifier } from './ledger.verifier.js';

describe('the ledger', () => {
  let server: TestApp;
  let world: World;
  let owner: pg.Client;

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
    owner = new pg.Client({ connectionString: server.database.ownerUrl });
    await owner.connect();
  });
  afterAll(async () => {
    await owner?.end();
    await server?.close();
  });

  const say = async (lot: number, text: string) => {
    const path = `/api/lots/${world.lots[lot]?.id}/comments`;
    const answer = await world.as('plumber').post(path, { clientId: randomUUID(), madeAt: testNow, text });
    expect(answer.status).toBe(201);
  };
  const check = (lot: number) => world.as('superintendent').get(`/api/lots/${world.lots[lot]?.id}/ledger/check`);
  /** What only the owner of the tables can do, and only by lifting the guard. */
  const unguarded = async (sql: string, values: unknown[]) => {
    await owner.query('ALTER TABLE ledger_entries DISABLE TRIGGER ledger_append_only');
    await owner.query(sql, values);
    await owner.query('ALTER TABLE ledger_entries ENABLE TRIGGER ledger_append_only');
  };

  it('counts from 1 per lot and answers that no entry was altered', async () => {
    await say(0, 'one');
    await say(0, 'two');
    await say(1, 'another lot');
    const page = await world.as('superintendent').get(`/api/lots/${world.lots[0].id}/ledger`);
    expect(page.body.total).toBe(2);
    expect(page.body.items.map((entry: { sequence: number }) => entry.sequence)).toEqual([2, 1]);
    expect((await check(0)).body).toEqual({ isWhole: true, entries: 2, firstBroken: null });
  });

  it('keeps one chain when twenty write at once', async () => {
    await Promise.all(Array.from({ length: 20 }, (_, i) => say(2, `at once ${i}`)));
    expect((await check(2)).body).toEqual({ isWhole: true, entries: 20, firstBroken: null });
  });

  it('points at the entry that was altered', async () => {
    for (const text of ['a', 'b', 'c']) await say(3, text);
    await unguarded(`UPDATE ledger_entries SET payload = '{"commentId":"forged"}' WHERE lot_id = $1 AND sequence = 2`, [
      world.lots[3].id,
    ]);
    expect((await check(3)).body).toMatchObject({ isWhole: false, firstBroken: 2 });
  });

  it('points past the last entry when the tail was cut', async () => {
    for (const text of ['a', 'b', 'c']) await say(4, text);
    await unguarded('DELETE FROM ledger_entries WHERE lot_id = $1 AND sequence = 3', [world.lots[4].id]);
    expect((await check(4)).body).toMatchObject({ isWhole: false, entries: 2, firstBroken: 3 });
    const all = await server.get(LedgerVerifier).verifyAll();
    expect(all.broken.map(({ firstBroken }) => firstBroken).sort()).toEqual([2, 3]);
  });

  it.each([
    ['update', 'UPDATE ledger_entries SET kind = kind'],
    ['delete', 'DELETE FROM ledger_entries'],
    ['truncate', 'TRUNCATE ledger_entries'],
  ])('cannot be changed by the application: %s (SQLSTATE 42501, insufficient privilege)', async (_what, sql) => {
    const app = new pg.Client({ connectionString: server.database.appUrl });
    await app.connect();
    await expect(app.query(sql)).rejects.toMatchObject({ code: '42501' });
    await app.end();
  });

  it('stops its own owner too, while the guard stands (SQLSTATE 23000)', async () => {
    await expect(owner.query('UPDATE ledger_entries SET kind = kind')).rejects.toMatchObject({ code: '23000' });
    await expect(owner.query('TRUNCATE ledger_entries')).rejects.toMatchObject({ code: '23000' });
  });

  it('is not there for people of other lots', async () => {
    expect((await world.as('otherSuperintendent').get(`/api/lots/${world.lots[0].id}/ledger`)).status).toBe(404);
    expect((await world.as('otherSuperintendent').get(`/api/lots/${world.lots[0].id}/ledger/check`)).status).toBe(404);
  });
});
