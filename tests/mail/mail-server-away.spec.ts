import { type Mailbox, startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { book, listInvited, listTakeable } from '../support/booking.js';
import { listInvites } from '../support/invites.js';
import { connectAsOwner, type OwnerConnection } from '../support/owner-connection.js';
import { seedDatabase, type SeededDatabase } from '../support/seeded-database.js';
import type { ServerProcess } from '../support/server-process.js';
import { useServers } from '../support/use-servers.js';

/** The first try again comes half a minute after the failure, by the clock. */
const retryMs = 120_000;

describe('a mail server that is away while visits are booked', () => {
  let mailbox: Mailbox;
  let seeded: SeededDatabase;
  let tables: OwnerConnection;
  let server: ServerProcess;

  afterAll(async () => {
    await tables?.close();
    await mailbox?.stop();
    await seeded?.database.drop();
  });
  const servers = useServers();
  beforeAll(async () => {
    mailbox = await startMailbox();
    seeded = await seedDatabase();
    tables = await connectAsOwner(seeded.database);
    server = await servers.start(seeded.environment(mailbox.smtpUrl));
  });

  const deliveries = () =>
    tables.rows<{ address: string; state: string; attempts: number; lastError: string | null }>(
      'SELECT address, state, attempts, last_error AS "lastError" FROM deliveries ORDER BY position',
    );

  it('gets each email once, and in order, when it is back', async () => {
    const port = Number(new URL(mailbox.smtpUrl).port);
    await mailbox.stop();

    const lotId = seeded.world.lots[0].id;
    const [first, second] = await listTakeable(seeded, server.url, lotId);
    if (!first || !second) throw new Error('no window to take');
    const booked = await book(seeded, server.url, lotId, first);
    const moved = await seeded.as('superintendent', server.url).post(`/api/visits/${booked.id}/move`, {
      expectedVersion: booked.version,
      date: second.date,
      label: second.label,
    });
    expect(moved.status).toBe(200);
    // every booking was tried in vain, and the moves wait behind them
    await vi.waitFor(
      async () => {
        const tried = (await deliveries()).filter(({ attempts }) => attempts > 0);
        expect(tried).toHaveLength(3);
        for (const { state, lastError } of tried) {
          expect(state).toBe('waiting');
          expect(lastError).toContain('ECONNREFUSED');
        }
      },
      { timeout: 30_000 },
    );

    mailbox = await startMailbox({ smtpPort: port });
    await vi.waitFor(
      async () => {
        const states = (await deliveries()).map(({ state }) => state);
        expect(states).toEqual(Array<string>(6).fill('sent'));
      },
      { timeout: retryMs, interval: 500 },
    );

    const invites = listInvites(mailbox);
    expect(invites).toHaveLength(6);
    expect(new Set(invites.map(({ messageId }) => messageId)).size).toBe(6);
    expect(new Set(invites.map(({ uid }) => uid)).size).toBe(1);
    const people = listInvited(seeded, booked);
    expect([...new Set(invites.map(({ to }) => to))].sort()).toEqual(people);
    for (const person of people) {
      const [invite, update] = invites.filter(({ to }) => to === person);
      const attendee = `mailto:${person}`;
      expect(invite).toMatchObject({ method: 'REQUEST', startAt: first.startAt, endAt: first.endAt, attendee });
      expect(update).toMatchObject({ method: 'REQUEST', startAt: second.startAt, endAt: second.endAt, attendee });
      // RFC 5546 2.1.4: a later revision carries a greater SEQUENCE
      expect(update?.sequence).toBeGreaterThan(invite?.sequence ?? Infinity);
    }
  });
});
