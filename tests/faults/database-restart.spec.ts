import { randomUUID } from 'node:crypto';
import { type Mailbox, startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { io, type Socket } from 'socket.io-client';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { ask, listTakeable } from '../support/booking.js';
import { startDatabaseStorm, type DatabaseStorm } from '../support/database-storm.js';
import { connectAsOwner, type OwnerConnection } from '../support/owner-connection.js';
import { seedDatabase, type SeededDatabase } from '../support/seeded-database.js';
import type { ServerProcess } from '../support/server-process.js';
import { useServers } from '../support/use-servers.js';

const lotCount = 36;
const workers = 6;
const triesOfOne = 200;
const patience = { timeout: 120_000, interval: 500 };

describe('a database that restarts under load', () => {
  let mailbox: Mailbox;
  let seeded: SeededDatabase;
  let tables: OwnerConnection;
  let storm: DatabaseStorm;
  let one: ServerProcess;
  let two: ServerProcess;
  let socket: Socket | null = null;

  afterAll(async () => {
    socket?.disconnect();
    await storm?.end();
    await tables?.close();
    await mailbox?.stop();
    await seeded?.database.drop();
  });
  const servers = useServers();
  beforeAll(async () => {
    mailbox = await startMailbox();
    seeded = await seedDatabase(lotCount);
    const environment = seeded.environment(mailbox.smtpUrl);
    [one, two] = await Promise.all([servers.start(environment), servers.start(environment)]);
    storm = await startDatabaseStorm(seeded.database);
  });

  /** Asks until the lot has its visit, always under one key, as a page does; only `busy` may come between. */
  async function bookThrough(lotId: string, window: { date: string; label: string }, url: string): Promise<void> {
    const key = randomUUID();
    for (let tries = 1; tries <= triesOfOne; tries += 1) {
      const { status, body } = await ask(seeded, url, lotId, window, key);
      await storm.answered(status === 503);
      if (status === 201) return;
      expect({ status, code: body.code }).toEqual({ status: 503, code: 'busy' });
    }
    throw new Error(`no visit after ${triesOfOne} tries`);
  }

  it('fails no request but cleanly, and every request is done once in the end', async () => {
    const [firstLot] = seeded.lots;
    const windows = await listTakeable(seeded, one.url, firstLot?.id ?? '');
    const seats = windows.flatMap((window) => Array.from({ length: window.roomLeft }, () => window));
    const jobs = seeded.lots.map((lot, index) => ({ lot, window: seats[index], url: (index % 2 ? two : one).url }));
    const work = async () => {
      for (let job = jobs.shift(); job; job = jobs.shift()) {
        if (!job.window) throw new Error('fewer seats than lots');
        await bookThrough(job.lot.id, job.window, job.url);
      }
    };
    await Promise.all(Array.from({ length: workers }, work));
    await storm.end();
    // the storm was one: connections were cut many times, and somebody met it
    expect(storm.cuts).toBeGreaterThan(4);
    expect(storm.busyAnswers).toBeGreaterThan(0);

    tables = await connectAsOwner(seeded.database);
    const written = await tables.rows<{ visits: number; requested: number; booked: number; events: number }>(
      `SELECT (SELECT count(*)::int FROM visits v WHERE v.lot_id = l.id AND v.state = 'booked') AS visits,
         (SELECT count(*)::int FROM ledger_entries e JOIN visits v ON v.id::text = e.payload->>'visitId'
           WHERE e.lot_id = l.id AND e.kind = 'visit-requested') AS requested,
         (SELECT count(*)::int FROM ledger_entries e JOIN visits v ON v.id::text = e.payload->>'visitId'
           WHERE e.lot_id = l.id AND e.kind = 'visit-booked') AS booked,
         (SELECT count(*)::int FROM outbox_events o JOIN visits v ON v.id = o.visit_id
           WHERE o.lot_id = l.id AND o.kind = 'visit-booked') AS events
       FROM lots l WHERE l.id = ANY ($1)`,
      [seeded.lots.map(({ id }) => id)],
    );
    expect(written).toEqual(seeded.lots.map(() => ({ visits: 1, requested: 1, booked: 1, events: 1 })));
    const totals = await tables.rows(
      `SELECT (SELECT count(*)::int FROM visits) AS visits, (SELECT count(*)::int FROM outbox_events) AS events,
         (SELECT count(*)::int FROM ledger_entries WHERE kind LIKE 'visit-%') AS entries`,
    );
    expect(totals).toEqual([{ visits: lotCount, events: lotCount, entries: 2 * lotCount }]);
    const chains = await seeded.as('operator', one.url).get('/api/operations/ledger');
    expect(chains.body).toMatchObject({ entries: 2 * lotCount, broken: [] });
  });

  it('finds both servers well again without anybody’s help: ready, telling, and live', async () => {
    for (const { url } of [one, two]) expect((await fetch(`${url}/api/ready`)).status).toBe(200);
    await vi.waitFor(async () => {
      const untold = await tables.rows(`SELECT last_error FROM outbox_events WHERE processed_at IS NULL`);
      expect(untold).toEqual([]);
    }, patience);

    const lotId = seeded.world.lots[0].id;
    const auth = { token: seeded.world.tokenOf('inspector') };
    const connected = io(two.url, { auth, transports: ['websocket'], forceNew: true });
    socket = connected;
    await vi.waitFor(() => expect(connected.connected).toBe(true), patience);
    expect(await connected.emitWithAck('lot:watch', { lotId })).toEqual({ ok: true });
    const heard: string[][] = [];
    connected.on('changed', ({ topics }: { topics: string[] }) => heard.push(topics));
    // the servers find each other again on their own: some comment, soon, is heard across
    await vi.waitFor(async () => {
      const body = { clientId: randomUUID(), madeAt: new Date().toISOString(), text: 'Are you there' };
      const answer = await seeded.as('helper', one.url).post(`/api/lots/${lotId}/comments`, body);
      expect(answer.status).toBe(201);
      expect(heard.flat()).toContain('thread');
    }, patience);
  });
});
