/** `npm test`: every check there is, from a fresh clone, with a PostgreSQL of its own. Its last line is the total. */
import { existsSync } from 'node:fs';
import path from 'node:path';
import { ensureBuilt, getTool, runTool, typecheckAll } from './lib/build.mjs';
import { getChromium } from './lib/chromium.mjs';
import { findJson } from './lib/json-file.mjs';
import { runCommandLine } from './lib/lifetime.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { prepareDataFolders, root } from './lib/paths.mjs';
import { ensurePostgres } from './lib/postgres-programs.mjs';
import { findPostgresUser } from './lib/postgres-user.mjs';
import { Problem, reportFailure, say } from './lib/problem.mjs';
import { getCleanEnvironment } from './lib/psql.mjs';
import { runInGroup } from './lib/spawning.mjs';
import { startTestDatabase } from './lib/test-database.mjs';
import { makeTestFolder } from './lib/test-folder.mjs';
import { countTestResults, formatTotals } from './lib/test-results.mjs';

const openData = path.resolve(root, '../shared/data');

/** Runs one of the checks beside the tests; a failure is counted and shown, and the others go on. */
async function runCheck(name, check) {
  say(`\n── ${name}`);
  try {
    if (await check()) return true;
    say(`${name}: failed; the reason is above.`);
  } catch (error) {
    reportFailure(error);
  }
  return false;
}

async function runChecks() {
  const checks = [
    ['Types', () => typecheckAll()],
    ['Page build', () => ensureBuilt(['page']).then(() => true)],
    ['Lint', async () => (await runTool('eslint', ['.'])) === 0],
  ];
  const results = [];
  for (const [name, check] of checks) results.push({ name, isPassed: await runCheck(name, check) });
  return results;
}

async function runTests(lifetime, filters, testFolder, env) {
  say('\n── Tests');
  const reportFile = path.join(testFolder, 'report.json');
  const args = ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${reportFile}`, ...filters];
  const exitCode = await runInGroup(lifetime, process.execPath, [getTool('vitest'), ...args], { cwd: root, env });
  return countTestResults(findJson(reportFile), exitCode);
}

function getTestEnvironment(adminUrl, chromium) {
  const data = process.env.HOLDWATER_OPEN_DATA ?? (existsSync(openData) ? openData : undefined);
  return {
    ...getCleanEnvironment(),
    NODE_ENV: 'test',
    TEST_DATABASE_ADMIN_URL: adminUrl,
    CHROMIUM_PATH: chromium,
    ...(data === undefined ? {} : { HOLDWATER_OPEN_DATA: data }),
  };
}

function printTotals(checks, tests) {
  const failedChecks = checks.filter(({ isPassed }) => !isPassed);
  say('');
  for (const { name } of failedChecks) say(`Failed: ${name}`);
  for (const name of tests.skipped) say(`Skipped: ${name.replace(`${root}/`, '')}`);
  const totals = {
    passed: tests.passed + checks.length - failedChecks.length,
    failed: tests.failed + failedChecks.length,
    skipped: tests.skipped.length,
  };
  say(formatTotals(totals));
  return totals.failed === 0 ? 0 : 1;
}

async function test(lifetime) {
  checkPlatform();
  prepareDataFolders();
  await ensurePackages();
  await ensurePostgres();
  const chromium = await getChromium();
  const user = await findPostgresUser();
  const testFolder = await makeTestFolder(lifetime, user);
  const checks = await runChecks();
  const adminUrl = await startTestDatabase(lifetime, testFolder, user);
  const tests = await runTests(lifetime, process.argv.slice(2), testFolder, getTestEnvironment(adminUrl, chromium));
  if (lifetime.ending) throw new Problem('Stopped before the end.');
  await lifetime.cleanUpNow();
  return printTotals(checks, tests);
}

runCommandLine(test);
