import { type Mailbox, startMailbox } from '@holdwater/fake-services/mailbox/start-mailbox.js';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { book, listInvited, listTakeable } from '../support/booking.js';
import { listInvites } from '../support/invites.js';
import { connectAsOwner, type OwnerConnection } from '../support/owner-connection.js';
import { seedDatabase, type SeededDatabase } from '../support/seeded-database.js';
import { useServers } from '../support/use-servers.js';

const patience = { timeout: 60_000, interval: 200 };

describe('a server that is killed between commit and mail', () => {
  let mailbox: Mailbox;
  let seeded: SeededDatabase;
  let tables: OwnerConnection;
  let gate: OwnerConnection;

  afterAll(async () => {
    await gate?.close();
    await tables?.close();
    await mailbox?.stop();
    await seeded?.database.drop();
  });
  const servers = useServers();
  beforeAll(async () => {
    mailbox = await startMailbox();
    seeded = await seedDatabase();
    tables = await connectAsOwner(seeded.database);
    gate = await connectAsOwner(seeded.database);
  });

  it('leaves the mail to the next one, which sends it once', async () => {
    const first = await servers.start(seeded.environment(mailbox.smtpUrl));
    const lotId = seeded.world.lots[0].id;
    const [window] = await listTakeable(seeded, first.url, lotId);
    if (!window) throw new Error('no window to take');

    // no delivery can be written while this is held, so the kill falls between the two for certain
    await gate.rows('BEGIN');
    await gate.rows('LOCK TABLE deliveries IN EXCLUSIVE MODE');
    const visit = await book(seeded, first.url, lotId, window);
    await first.kill();
    expect(await first.ended).toBe('SIGKILL');
    await gate.rows('ROLLBACK');
    expect(mailbox.messages()).toEqual([]);
    const waiting = await tables.rows(`SELECT kind FROM outbox_events WHERE visit_id = $1 AND processed_at IS NULL`, [
      visit.id,
    ]);
    expect(waiting).toEqual([{ kind: 'visit-booked' }]);

    const next = await servers.start(seeded.environment(mailbox.smtpUrl));
    await vi.waitFor(async () => {
      const sent = await tables.rows(`SELECT 1 FROM deliveries WHERE state = 'sent'`);
      expect(sent).toHaveLength(3);
    }, patience);
    // whoever starts once more finds nothing left to send
    await next.stop();
    const last = await servers.start(seeded.environment(mailbox.smtpUrl));
    const other = await listTakeable(seeded, last.url, seeded.world.lots[1].id);
    await book(seeded, last.url, seeded.world.lots[1].id, other[0] ?? window);
    // mail is sent in order: when the second visit's has arrived, whatever was left of the first would have too
    await vi.waitFor(async () => {
      const left = await tables.rows(`SELECT 1 FROM deliveries WHERE state <> 'sent'`);
      expect(left).toEqual([]);
      expect(listInvites(mailbox)).toHaveLength(6);
    }, patience);

    const invites = listInvites(mailbox).filter(({ uid }) => uid === listInvites(mailbox)[0]?.uid);
    expect(invites.map(({ to }) => to).sort()).toEqual(listInvited(seeded, visit));
    for (const invite of invites) {
      expect(invite).toMatchObject({ method: 'REQUEST', startAt: window.startAt, endAt: window.endAt });
    }
  });
});
