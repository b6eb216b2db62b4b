import { getDatabaseEnvironment } from './local-environment.mjs';
import { getLocalDatabaseUrls, startLocalDatabase } from './local-database.mjs';
import { Problem } from './problem.mjs';
import { getSecrets } from './secrets.mjs';
import { openSession } from './session.mjs';

const firstPort = 4310;

/** The server's variables must be there for a database command to start, and lead nowhere: it sends nothing. */
function getEnvironment(urls, secrets) {
  const nowhere = 9; // the discard port
  return getDatabaseEnvironment({ urls, secrets, ports: { web: firstPort, server: firstPort, smtp: nowhere } });
}

/**
 * Runs `work` with this checkout's own database: the one that a running `npm start` uses, else started for the purpose.
 * @param work gets { env, isShared }
 */
export async function withLocalDatabase(lifetime, command, work) {
  const { addresses } = await openSession(lifetime, command);
  if (!addresses) {
    const { urls, secrets } = await startLocalDatabase(lifetime, { firstPort, takenPorts: [] });
    return work({ env: getEnvironment(urls, secrets), isShared: false });
  }
  const { secrets, areKept } = getSecrets();
  if (!areKept)
    throw new Problem(
      '.data/secrets.json is missing or damaged. Stop npm start (Ctrl-C there) and run this command again: it makes new ones.',
    );
  const urls = getLocalDatabaseUrls(Number(new URL(addresses.database).port), secrets);
  return work({ env: getEnvironment(urls, secrets), isShared: true });
}
