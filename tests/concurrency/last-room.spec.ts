import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ask, book, listTakeable } from '../support/booking.js';
import { connectAsOwner, type OwnerConnection } from '../support/owner-connection.js';
import { seedDatabase, type SeededDatabase } from '../support/seeded-database.js';
import type { ServerProcess } from '../support/server-process.js';
import { useServers } from '../support/use-servers.js';

const askers = 50;
const noMail = 'smtp://127.0.0.1:9';

describe('the last room of a window, over two server processes', () => {
  let seeded: SeededDatabase;
  let tables: OwnerConnection;
  let one: ServerProcess;
  let two: ServerProcess;

  afterAll(async () => {
    await tables?.close();
    await seeded?.database.drop();
  });
  const servers = useServers();
  beforeAll(async () => {
    seeded = await seedDatabase(askers);
    tables = await connectAsOwner(seeded.database);
    const environment = { ...seeded.environment(noMail), ROLE: 'web' };
    [one, two] = await Promise.all([servers.start(environment), servers.start(environment)]);
  });

  it(`goes to exactly one of ${askers} who ask at once; the others are offered the next best`, async () => {
    const { lots, world } = seeded;
    const [window] = await listTakeable(seeded, one.url, world.lots[0].id);
    if (!window) throw new Error('no window to take');
    for (let taken = 0; taken < window.roomLeft - 1; taken += 1) {
      const lot = world.lots[taken];
      if (!lot) throw new Error('the window has more room than the world has lots');
      await book(seeded, one.url, lot.id, window);
    }

    const answers = await Promise.all(
      lots.map((lot, index) => ask(seeded, (index % 2 === 0 ? one : two).url, lot.id, window)),
    );
    expect(answers).toHaveLength(askers);
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
    const refused = answers.filter(({ status }) => status !== 201);
    for (const { status, body } of refused) {
      expect({ status, code: body.code }).toEqual({ status: 409, code: 'window-full' });
      const { offers } = body.params as { offers: Array<{ date: string; label: string; isTakeable: boolean }> };
      expect(offers).toHaveLength(3);
      for (const offer of offers) {
        expect(offer.isTakeable).toBe(true);
        expect([offer.date, offer.label]).not.toEqual([window.date, window.label]);
      }
    }

    const places = await tables.rows<{ place: number }>(
      `SELECT place FROM visits WHERE window_date = $1 AND window_label = $2 AND state = 'booked' ORDER BY place`,
      [window.date, window.label],
    );
    expect(places).toEqual(Array.from({ length: window.roomLeft }, (_, index) => ({ place: index + 1 })));
    const [written] = await tables.rows(
      `SELECT (SELECT count(*)::int FROM visits) AS visits,
         (SELECT count(*)::int FROM ledger_entries WHERE kind = 'visit-booked') AS entries,
         (SELECT count(*)::int FROM outbox_events WHERE kind = 'visit-booked') AS events`,
    );
    expect(written).toEqual({ visits: window.roomLeft, entries: window.roomLeft, events: window.roomLeft });
  });
});
