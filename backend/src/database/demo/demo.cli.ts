import 'reflect-metadata';
import { writeFileSync } from 'node:fs';
import { QueryTypes, Sequelize } from 'sequelize';
import { joinTransactionsByContext } from '../../common/unit-of-work/transaction-context.js';
import { readEnvironment } from '../../config/environment.js';
import { demoSignIns } from './demo-people.js';
import { emptyDatabase } from './empty-database.js';
import { makeDemo } from './make-demo.js';

joinTransactionsByContext();

const environment = readEnvironment(process.env);
if (environment.HOLDWATER_MODE !== 'demo' || environment.NODE_ENV === 'production') {
  console.error(
    'Nothing was changed. Demo data is made only where HOLDWATER_MODE is demo and NODE_ENV is not production.',
  );
  process.exit(1);
}
const ownerUrl = environment.DATABASE_MIGRATION_URL;
if (!ownerUrl) {
  console.error('Nothing was changed. Set DATABASE_MIGRATION_URL, the role that owns the schema.');
  process.exit(1);
}

const owner = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false });
try {
  if (process.argv.includes('--reset')) {
    await emptyDatabase(owner);
    console.log('The database was emptied.');
  }
  const [found] = await owner.query<{ is_empty: boolean }>('SELECT NOT EXISTS (SELECT 1 FROM persons) AS is_empty', {
    type: QueryTypes.SELECT,
  });
  if (found?.is_empty) {
    console.log(
      'Making the demo: two builders, three plumbers, four departments and some weeks of visits. This takes up to a minute, once.',
    );
    try {
      const acts = await makeDemo(environment, new Date());
      console.log(`The demo is there: ${acts} acts told.`);
    } catch (error) {
      // half a story is worse than none: the next start makes it whole
      await emptyDatabase(owner);
      throw error;
    }
  }
} finally {
  await owner.close();
}

const peopleFile = process.env.DEMO_PEOPLE_FILE;
if (peopleFile) writeFileSync(peopleFile, JSON.stringify({ demo: demoSignIns() }, null, 2), { mode: 0o600 });
process.exit(0);
