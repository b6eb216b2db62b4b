/** `npm run demo:reset`: empties this checkout's own database and makes the demo anew. */
import { findAddresses, formatSignIns, writeAddresses } from './lib/addresses.mjs';
import { ensureBuilt } from './lib/build.mjs';
import { migrateDatabase, seedDemo } from './lib/database-commands.mjs';
import { runCommandLine } from './lib/lifetime.mjs';
import { withLocalDatabase } from './lib/local-database-access.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { Problem, say } from './lib/problem.mjs';

async function resetDemo(lifetime) {
  checkPlatform();
  if ([process.env.NODE_ENV, process.env.HOLDWATER_MODE].includes('production')) {
    throw new Problem(
      'The environment says production, and this command empties a database. On a machine for the demo, run it without NODE_ENV and HOLDWATER_MODE.',
    );
  }
  const demo = await withLocalDatabase(lifetime, 'npm run demo:reset', async ({ env, isShared }) => {
    await ensurePackages();
    await ensureBuilt(['server']);
    await migrateDatabase(env);
    const people = await seedDemo(env, { reset: true });
    const addresses = isShared ? findAddresses() : null;
    if (addresses) writeAddresses({ ...addresses, demo: people });
    return people;
  });
  say('The demo is made anew.');
  for (const line of formatSignIns(demo)) say(line);
}

runCommandLine(resetDemo);
