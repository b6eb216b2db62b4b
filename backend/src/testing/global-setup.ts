import { createTemplate, dropTemplate } from './test-database.js';

/** Runs once before all tests, though vitest calls it once a project. Without a database the tests that need one say so themselves. */
export async function setup(): Promise<void> {
  if (!process.env.TEST_DATABASE_ADMIN_URL || process.env.TEST_DATABASE_TEMPLATE) return;
  await createTemplate();
}

export async function teardown(): Promise<void> {
  if (process.env.TEST_DATABASE_TEMPLATE) await dropTemplate();
}
