import { Clock, SystemClock } from '@holdwater/backend/common/time/clock.js';
import type { LotModel } from '@holdwater/backend/lots/lot.model.js';
import { type Caller, callerOf } from '@holdwater/backend/testing/fixtures/caller.js';
import { addLots, asOwner } from '@holdwater/backend/testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { startTestApp } from '@holdwater/backend/testing/test-app.js';
import { cloneDatabase, type TestDatabase } from '@holdwater/backend/testing/test-database.js';

const jwtSecret = 'a secret of the tests, of no use elsewhere';

export interface SeededDatabase {
  database: TestDatabase;
  world: World;
  /** More lots of the first set, beside those of the world. */
  lots: LotModel[];
  /** Calls one of the servers as a person. */
  as(person: WorldPerson, url: string): Caller;
  /** The environment of a server on this database; `smtpUrl` is where its mail goes. */
  environment(smtpUrl: string): Record<string, string>;
}

/**
 * A database with the rows of the tests' world, made at the real present. The server that made them is gone again: nothing but the
 * processes a test starts works on the database.
 */
export async function seedDatabase(lotCount = 0): Promise<SeededDatabase> {
  const database = await cloneDatabase();
  const server = await startTestApp({
    database,
    now: new Date().toISOString(),
    environment: { JWT_SECRET: jwtSecret },
    override: (builder) => builder.overrideProvider(Clock).useValue(new SystemClock()),
  });
  try {
    const world = await createWorld(server);
    const lots = await addLots(server, world, lotCount);
    // in force since long ago, whatever the day is on which the tests run
    await asOwner(server, `UPDATE rule_cards SET effective = daterange('2020-01-01', NULL)`, []);
    const as = (person: WorldPerson, url: string) => callerOf(url, world.tokenOf(person));
    const environment = (smtpUrl: string) => environmentOf(database, smtpUrl);
    return { database, world, lots, as, environment };
  } finally {
    await server.close();
  }
}

/** What a built server needs to know, but for its port and address. */
export function environmentOf(database: TestDatabase, smtpUrl: string): Record<string, string> {
  return {
    NODE_ENV: 'production',
    HOLDWATER_MODE: 'demo',
    DATABASE_URL: database.appUrl,
    JWT_SECRET: jwtSecret,
    SMTP_URL: smtpUrl,
    MAIL_FROM: 'visits@example.test',
    LOG_LEVEL: 'warn',
  };
}
