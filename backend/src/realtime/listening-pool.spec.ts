import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cloneDatabase, type TestDatabase } from '../testing/test-database.js';
import { ListeningPool } from './listening-pool.js';

// The adapter of the sockets keeps the client that listens and gives it back only once it does: a pool waits for whoever is out.
describe('the pool the sockets listen through', () => {
  let database: TestDatabase;
  beforeAll(async () => {
    database = await cloneDatabase();
  });
  afterAll(() => database.drop());
  const open = () => new ListeningPool({ connectionString: database.appUrl, max: 4 });

  it('ends while the listener is still connecting', async () => {
    const pool = open();
    void pool.connect();
    await pool.end();
    expect(pool.totalCount).toBe(0);
  });

  it('ends while the listener is out', async () => {
    const pool = open();
    await pool.connect();
    await pool.end();
    expect(pool.totalCount).toBe(0);
  });

  it('ends when the listener was given back before', async () => {
    const pool = open();
    const client = await pool.connect();
    client.removeAllListeners('end');
    client.release();
    await pool.end();
    expect(pool.totalCount).toBe(0);
  });

  it('keeps one listener: who asks again takes the place of the one before', async () => {
    const pool = open();
    await pool.connect();
    const second = await pool.connect();
    await expect(second.query('SELECT 1 AS one')).resolves.toMatchObject({ rows: [{ one: 1 }] });
    await pool.end();
    expect(pool.totalCount).toBe(0);
  });
});
