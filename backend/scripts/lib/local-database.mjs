import { existsSync } from 'node:fs';
import path from 'node:path';
import { shownPath } from './paths.mjs';
import { getFreePort } from './ports.mjs';
import { say } from './problem.mjs';
import { ensureCluster, setAdminPassword, startCluster } from './postgres-cluster.mjs';
import { endLeftoverServer } from './postgres-leftover.mjs';
import { ensurePostgres } from './postgres-programs.mjs';
import { findPostgresUser, getClusterFolder, getClusterUser } from './postgres-user.mjs';
import { getDatabaseUrl, runAdminSql } from './psql.mjs';
import { getSecrets, keepSecrets } from './secrets.mjs';

const database = 'holdwater';
const ownerRole = 'holdwater_owner';
const appRole = 'holdwater_app';

/** Roles and database, made when missing; the passwords are set anew each time, so that a lost secrets file does no harm. */
function getSetupSql({ ownerPassword, appPassword }) {
  const roles = [
    [ownerRole, ownerPassword],
    [appRole, appPassword],
  ].map(
    ([role, password]) => `
SELECT 'CREATE ROLE ${role}' WHERE NOT EXISTS (SELECT FROM pg_roles WHERE rolname = '${role}') \\gexec
ALTER ROLE ${role} WITH LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE PASSWORD '${password}';`,
  );
  return `${roles.join('\n')}
SELECT 'CREATE DATABASE ${database} OWNER ${ownerRole}' WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = '${database}') \\gexec
REVOKE ALL ON DATABASE ${database} FROM PUBLIC;
GRANT CONNECT, TEMPORARY ON DATABASE ${database} TO ${appRole};
`;
}

/** The connection URLs of the local database at a port, by role. */
export function getLocalDatabaseUrls(port, { ownerPassword, appPassword }) {
  return {
    app: getDatabaseUrl({ role: appRole, password: appPassword, port, database }),
    owner: getDatabaseUrl({ role: ownerRole, password: ownerPassword, port, database }),
  };
}

/** Makes the cluster when there is none, and sees to it that the superuser's password is the one kept. */
async function prepareCluster(folder, user) {
  const { secrets, areKept } = getSecrets();
  await endLeftoverServer(folder);
  if (!existsSync(path.join(folder, 'PG_VERSION'))) {
    say(`Making a database in ${shownPath(folder)} …`);
    if (!areKept) keepSecrets(secrets);
    await ensureCluster({ folder, user, adminPassword: secrets.adminPassword });
  } else if (!areKept) {
    // The secrets file was lost. Kept only when set: killed in between, the next run does it again.
    await setAdminPassword({ folder, user }, secrets.adminPassword);
    keepSecrets(secrets);
  }
  return secrets;
}

/**
 * Starts this checkout's own PostgreSQL, with its roles and its database. The caller holds the session's lock.
 * @param options.takenPorts ports chosen already for something else
 * @returns { port, urls: { app, owner }, service, folder, secrets }
 */
export async function startLocalDatabase(lifetime, { firstPort, takenPorts }) {
  await ensurePostgres();
  const postgresUser = await findPostgresUser();
  const folder = await getClusterFolder(postgresUser);
  const user = getClusterUser(postgresUser, folder);
  const secrets = await prepareCluster(folder, user);
  const port = await getFreePort(firstPort, takenPorts);
  const { service } = await startCluster(lifetime, { folder, user, port });
  await runAdminSql({ port, password: secrets.adminPassword }, getSetupSql(secrets));
  return { port, urls: getLocalDatabaseUrls(port, secrets), service, folder, secrets };
}
