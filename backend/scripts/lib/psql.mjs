import path from 'node:path';
import { Problem } from './problem.mjs';
import { loopback } from './ports.mjs';
import { adminRole } from './postgres-cluster.mjs';
import { getProgramFolder } from './postgres-programs.mjs';
import { runQuietly } from './spawning.mjs';

/** The environment without PG… variables: those of the person's own databases must not steer ours. */
export function getCleanEnvironment() {
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !/^PG[A-Z]+$/.test(name)));
}

/** A connection URL on loopback. */
export function getDatabaseUrl({ role, password, port, database }) {
  return `postgres://${role}:${encodeURIComponent(password)}@${loopback}:${port}/${database}`;
}

/**
 * Runs SQL as the cluster's superuser and returns what it prints.
 * @throws Problem with PostgreSQL's own words
 */
export async function runAdminSql({ port, password }, sql) {
  const args = [
    '-X',
    '-q',
    '-A',
    '-t',
    '-v',
    'ON_ERROR_STOP=1',
    '-h',
    loopback,
    '-p',
    String(port),
    '-U',
    adminRole,
    '-d',
    'postgres',
  ];
  const env = { ...getCleanEnvironment(), PGPASSWORD: password, PGCONNECT_TIMEOUT: '10', PGCLIENTENCODING: 'UTF8' };
  const { code, output } = await runQuietly(path.join(getProgramFolder(), 'psql'), args, { input: sql, env, cwd: '/' });
  if (code !== 0) throw new Problem(`PostgreSQL refused to set up the local database:\n\n${output}`);
  return output;
}
