import path from 'node:path';
import { adminRole, ensureCluster, startCluster } from './postgres-cluster.mjs';
import { getDatabaseUrl } from './psql.mjs';
import { createSecret } from './secrets.mjs';

/** A test loses its data with the test: speed instead of safety against a power failure. Many tests connect at once. */
const settings = [
  'fsync=off',
  'synchronous_commit=off',
  'full_page_writes=off',
  'max_connections=300',
  'shared_buffers=128MB',
];

/** Starts an empty PostgreSQL of its own for one test run; returns the URL of its superuser. */
export async function startTestDatabase(lifetime, testFolder, user) {
  const folder = path.join(testFolder, 'postgres');
  const adminPassword = createSecret();
  await ensureCluster({ folder, user, adminPassword, isTemporary: true });
  const { port } = await startCluster(lifetime, { folder, user, settings, logFolder: testFolder });
  return getDatabaseUrl({ role: adminRole, password: adminPassword, port, database: 'postgres' });
}
