/** `npm run db:migrate`: brings the database named by the environment, else this checkout's own, to the present shape. */
import { migrateDatabase } from './lib/database-commands.mjs';
import { ensureBuilt, isBuilt } from './lib/build.mjs';
import { runCommandLine } from './lib/lifetime.mjs';
import { withLocalDatabase } from './lib/local-database-access.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { prepareDataFolders } from './lib/paths.mjs';
import { Problem, say } from './lib/problem.mjs';

const urlNames = ['DATABASE_URL', 'DATABASE_MIGRATION_URL'];

async function migrateNamedDatabase() {
  const missing = urlNames.filter((name) => !process.env[name]);
  if (missing.length > 0) {
    throw new Problem(
      `${missing[0]} is not set. Set both: DATABASE_MIGRATION_URL for the role that owns the database, DATABASE_URL for the role the server uses. ` +
        "Or set neither, to migrate this checkout's own database.",
    );
  }
  // In production the build is part of the delivery; making another one is not this command's business.
  if (process.env.NODE_ENV !== 'production' || !isBuilt('server')) {
    prepareDataFolders();
    await ensureBuilt(['server']);
  }
  await migrateDatabase({ ...process.env, TZ: 'UTC' });
}

async function migrate(lifetime) {
  checkPlatform();
  if (urlNames.some((name) => process.env[name])) {
    await migrateNamedDatabase();
  } else {
    if (process.env.NODE_ENV === 'production')
      throw new Problem(`In production, set ${urlNames.join(' and ')} to say which database to migrate.`);
    await withLocalDatabase(lifetime, 'npm run db:migrate', async ({ env }) => {
      await ensurePackages();
      await ensureBuilt(['server']);
      await migrateDatabase(env);
    });
  }
  say('The database has the present shape.');
}

runCommandLine(migrate);
