import { createHash, randomUUID } from 'node:crypto';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';
import { LedgerAnchors } from './ledger-anchors.service.js';
import { LedgerVerifier } from './ledger.verifier.js';

const dayMinutes = 24 * 60;

describe('the daily anchor over all chains', () => {
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

  const say = (lot: number, text: string) =>
    world
      .as('plumber')
      .post(`/api/lots/${world.lots[lot]?.id}/comments`, { clientId: randomUUID(), madeAt: testNow, text })
      .expect(201);
  const verify = () => server.get(LedgerVerifier).verifyAll();
  const rows = async (sql: string, values: unknown[] = []) => (await owner.query(sql, values)).rows;
  /** As whoever owns the tables and lifts every guard. */
  const unguarded = async (sql: string, values: unknown[]) => {
    await owner.query('SET session_replication_role = replica');
    await owner.query(sql, values);
    await owner.query('SET session_replication_role = origin');
  };

  it('is written once a day, however many ask for it at once, and names only heads that moved', async () => {
    await say(0, 'one');
    await say(0, 'two');
    await say(1, 'other lot');
    const anchors = server.get(LedgerAnchors);
    const written = await Promise.all([1, 2, 3, 4].map(() => anchors.anchorToday()));
    expect(written.filter(Boolean)).toHaveLength(1);
    expect(await anchors.anchorToday()).toBe(false);
    server.clock.advance(dayMinutes);
    await say(1, 'a day later');
    expect(await anchors.anchorToday()).toBe(true);
    const scope = (lot: number) => `lot:${world.lots[lot]?.id}`;
    const named = await rows('SELECT day::text, scope, sequence FROM ledger_anchor_heads ORDER BY day, sequence DESC');
    expect(named).toEqual([
      { day: '2027-03-02', scope: scope(0), sequence: 2 },
      { day: '2027-03-02', scope: scope(1), sequence: 1 },
      { day: '2027-03-03', scope: scope(1), sequence: 2 },
    ]);
    expect((await verify()).anchors).toEqual({ days: 2, lastDay: '2027-03-03', firstBroken: null });
  });

  // RFC 8785: members sorted by their names, no blanks; written out here by hand, not by the library the product uses
  it('is SHA-256 over its own facts, the anchor before and the heads in the order of their bytes', async () => {
    const [first, second] = await rows(
      'SELECT day::text, at, chains, previous_hash, hash FROM ledger_anchors ORDER BY day',
    );
    expect(first.previous_hash).toBe('0'.repeat(64));
    expect(second.previous_hash).toBe(first.hash);
    const heads = await rows(`SELECT scope, sequence, hash FROM ledger_anchor_heads WHERE day = '2027-03-03'`);
    const text = [
      `{"at":"${second.at.toISOString()}","chains":${heads.length},"day":"2027-03-03","previousHash":"${first.hash}"}`,
      ...heads.map(({ scope, sequence, hash }) => `{"hash":"${hash}","scope":"${scope}","sequence":${sequence}}`),
    ].join('\n');
    expect(createHash('sha256').update(text).digest('hex')).toBe(second.hash);
  });

  it('misses what was cut off a chain, though its head was cut with it', async () => {
    const lotId = world.lots[0].id;
    const [kept] = await rows('SELECT hash FROM ledger_entries WHERE lot_id = $1 AND sequence = 1', [lotId]);
    await unguarded('DELETE FROM ledger_entries WHERE lot_id = $1 AND sequence = 2', [lotId]);
    await unguarded('UPDATE ledger_heads SET sequence = 1, hash = $2 WHERE scope = $1', [`lot:${lotId}`, kept.hash]);
    const check = await world.as('superintendent').get(`/api/lots/${lotId}/ledger/check`);
    expect(check.body).toEqual({ isWhole: false, entries: 1, firstBroken: 2 });
    expect((await verify()).broken).toEqual([{ scope: `lot:${lotId}`, firstBroken: 2 }]);
  });

  it('misses a whole chain that was taken away', async () => {
    const scope = `lot:${world.lots[1].id}`;
    await unguarded('DELETE FROM ledger_entries WHERE scope = $1', [scope]);
    await unguarded('DELETE FROM ledger_heads WHERE scope = $1', [scope]);
    expect((await verify()).broken).toContainEqual({ scope, firstBroken: 1 });
  });

  it('tells the operator the first day whose anchor was altered', async () => {
    await unguarded(`UPDATE ledger_anchor_heads SET sequence = 1 WHERE day = '2027-03-03'`, []);
    const { body } = await world.as('operator').get('/api/operations/ledger');
    expect(body.anchors).toEqual({ days: 2, lastDay: '2027-03-03', firstBroken: '2027-03-03' });
  });

  it.each(['ledger_anchors', 'ledger_anchor_heads'])(
    'cannot be changed by the application: %s (SQLSTATE 42501, insufficient privilege)',
    async (table) => {
      const app = new pg.Client({ connectionString: server.database.appUrl });
      await app.connect();
      await expect(app.query(`UPDATE ${table} SET day = day`)).rejects.toMatchObject({ code: '42501' });
      await expect(app.query(`DELETE FROM ${table}`)).rejects.toMatchObject({ code: '42501' });
      await app.end();
    },
  );
});
