import PgBoss from 'pg-boss';
import { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { migrations } from './migrations/all.js';
import { outboxQueue, queueSchema } from './queue.js';

/** Brings a database to the newest schema. `log` gets one line a step. */
export async function migrate(ownerUrl: string, appUrl: string, log: (line: string) => void): Promise<void> {
  const db = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false });
  try {
    await createUmzug(db, log).up();
    await installQueue(ownerUrl);
    await grant(db, decodeURIComponent(new URL(appUrl).username), decodeURIComponent(new URL(ownerUrl).username));
  } finally {
    await db.close();
  }
}

/** Takes the last `steps` steps back. */
export async function rollBack(ownerUrl: string, steps: number): Promise<void> {
  const db = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false });
  try {
    await createUmzug(db, () => undefined).down({ step: steps });
  } finally {
    await db.close();
  }
}

/** Names of the steps a database has not had yet. */
export async function pendingMigrations(db: Sequelize): Promise<string[]> {
  const rows = await db.query<{ name: string }>('SELECT name FROM schema_steps', {
    raw: true,
    type: 'SELECT' as never,
  });
  const done = new Set((rows as Array<{ name: string }>).map((row) => row.name));
  return migrations.map((step) => step.name).filter((name) => !done.has(name));
}

function createUmzug(db: Sequelize, log: (line: string) => void) {
  return new Umzug({
    migrations: migrations.map((step) => ({
      name: step.name,
      up: async () => {
        await step.up(db);
        log(`migrated ${step.name}`);
      },
      down: () => step.down(db),
    })),
    storage: new SequelizeStorage({ sequelize: db, modelName: 'schema_steps', tableName: 'schema_steps' }),
    logger: undefined,
  });
}

/** The queue's own tables; the application only reads and writes them. */
async function installQueue(ownerUrl: string): Promise<void> {
  const boss = new PgBoss({ connectionString: ownerUrl, schema: queueSchema, supervise: false, schedule: false });
  boss.on('error', () => undefined);
  await boss.start();
  if ((await boss.getQueue(outboxQueue)) === null) await boss.createQueue(outboxQueue);
  await boss.stop({ graceful: false, wait: true });
}

/**
 * Gives the application's role what it needs and no more: no rights to change the schema, none to update, delete or truncate the ledger.
 * Nothing to do when one role does both, which production refuses.
 */
async function grant(db: Sequelize, appRole: string, ownerRole: string): Promise<void> {
  if (appRole === ownerRole) return;
  const role = `"${appRole.replaceAll('"', '""')}"`;
  await db.query(`
    GRANT USAGE ON SCHEMA public, ${queueSchema} TO ${role};
    GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA public, ${queueSchema} TO ${role};
    GRANT USAGE, SELECT ON ALL SEQUENCES IN SCHEMA public, ${queueSchema} TO ${role};
    GRANT EXECUTE ON ALL FUNCTIONS IN SCHEMA ${queueSchema} TO ${role};
    REVOKE UPDATE, DELETE, TRUNCATE ON ledger_entries, ledger_anchors, ledger_anchor_heads, lot_past_parties FROM ${role};
    REVOKE INSERT, UPDATE, DELETE, TRUNCATE ON schema_steps FROM ${role};
    REVOKE DELETE ON readings, holds, outcomes, outcome_systems, outcome_work, corrections, visits, comments FROM ${role};
    REVOKE DELETE ON ledger_heads FROM ${role};
  `);
}
