import { migrate } from './migrator.js';

const ownerUrl = process.env.DATABASE_MIGRATION_URL;
const appUrl = process.env.DATABASE_URL;
if (!ownerUrl || !appUrl) {
  console.error(
    'Nothing was migrated. Set DATABASE_MIGRATION_URL (the role that owns the schema) and DATABASE_URL (the role the server uses), then run it again.',
  );
  process.exit(1);
}
await migrate(ownerUrl, appUrl, console.log);
console.log('The database has the newest schema.');
