import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { migrate } from '../database/migrator.js';

/** Name of the migrated database that each test file clones; one a run, so that two runs may share a cluster. */
function templateName(): string {
  process.env.TEST_DATABASE_TEMPLATE ??= `holdwater_template_${process.pid}`;
  return process.env.TEST_DATABASE_TEMPLATE;
}

const appRole = 'holdwater_test_app';

/** A role that may create databases and roles; `npm test` starts a cluster and sets it. */
export function adminUrl(): string {
  const url = process.env.TEST_DATABASE_ADMIN_URL;
  if (!url)
    throw new Error('TEST_DATABASE_ADMIN_URL is not set: run the tests by npm test, which starts a database for them.');
  return url;
}

/** Makes the template once a run. */
export async function createTemplate(): Promise<void> {
  await withAdmin(async (client) => {
    await client.query(`CREATE DATABASE ${templateName()}`);
    await client.query(
      `DO $$ BEGIN CREATE ROLE ${appRole} LOGIN PASSWORD 'test'; EXCEPTION WHEN duplicate_object OR unique_violation THEN NULL; END $$`,
    );
  });
  await migrate(urlOf(templateName()), appUrlOf(templateName()), () => undefined);
}

/** Removes the template at the end of a run. */
export async function dropTemplate(): Promise<void> {
  await withAdmin(async (client) => {
    await client.query(`DROP DATABASE IF EXISTS ${templateName()} WITH (FORCE)`);
  });
}

export interface TestDatabase {
  /** As the application sees it. */
  appUrl: string;
  /** As its owner sees it. */
  ownerUrl: string;
  drop(): Promise<void>;
}

/** A fresh copy of the migrated database. */
export async function cloneDatabase(): Promise<TestDatabase> {
  const name = `holdwater_${randomUUID().replaceAll('-', '')}`;
  // a template may be copied by one session at a time only
  await withAdmin(async (client) => {
    await client.query('SELECT pg_advisory_lock(7411)');
    await client.query(`CREATE DATABASE ${name} TEMPLATE ${templateName()}`);
    await client.query('SELECT pg_advisory_unlock(7411)');
  });
  return {
    appUrl: appUrlOf(name),
    ownerUrl: urlOf(name),
    drop: () =>
      withAdmin(async (client) => {
        await client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
      }),
  };
}

async function withAdmin(work: (client: pg.Client) => Promise<void>): Promise<void> {
  const client = new pg.Client({ connectionString: adminUrl() });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}

function urlOf(database: string): string {
  const url = new URL(adminUrl());
  url.pathname = `/${database}`;
  return url.href;
}

function appUrlOf(database: string): string {
  const url = new URL(urlOf(database));
  url.username = appRole;
  url.password = 'test';
  return url.href;
}
