import { createTemplate, dropTemplate } from './test-database.js';

/** Runs once before all tests. Without a database the tests that need one say so themselves. */
export async function setup(): Promise<void> {
  if (process.env.TEST_DATABASE_ADMIN_URL) await createTemplate();
}

export async function teardown(): Promise<void> {
  if (process.env.TEST_DATABASE_ADMIN_URL) await dropTemplate();
}
