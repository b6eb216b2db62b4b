import type { TestDatabase } from '@holdwater/backend/testing/test-database.js';
import { adminUrl } from '@holdwater/backend/testing/test-database.js';
import pg from 'pg';

/** A connection of the tests beside the servers' own. Close it in the end. */
export interface OwnerConnection {
  rows<Row>(sql: string, values?: unknown[]): Promise<Row[]>;
  close(): Promise<void>;
}

/** As the owner of the tables. */
export function connectAsOwner(database: TestDatabase): Promise<OwnerConnection> {
  return connect(database.ownerUrl);
}

/** To the cluster's own database: it outlives whatever happens to the test's. */
export function connectAsAdmin(): Promise<OwnerConnection> {
  return connect(adminUrl());
}

/** The name of a test's database within the cluster. */
export function nameOf(database: TestDatabase): string {
  return new URL(database.ownerUrl).pathname.slice(1);
}

async function connect(connectionString: string): Promise<OwnerConnection> {
  const client = new pg.Client({ connectionString });
  await client.connect();
  return {
    rows: async <Row>(sql: string, values: unknown[] = []) => (await client.query(sql, values)).rows as Row[],
    close: () => client.end(),
  };
}
