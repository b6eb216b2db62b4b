import { existsSync, rmSync } from 'node:fs';
import path from 'node:path';
import { findJson } from './json-file.mjs';
import { paths, root, shownPath } from './paths.mjs';
import { Problem } from './problem.mjs';
import { runShown } from './spawning.mjs';

const migrateProgram = path.join(root, 'backend/dist/database/migrate.cli.js');
const demoProgram = path.join(root, 'backend/dist/database/demo/demo.cli.js');

async function runProgram(program, args, env, whatFailed) {
  if (!existsSync(program)) throw new Problem(`${shownPath(program)} is missing. Build it with: npm run build`);
  const code = await runShown(process.execPath, [program, ...args], { env, cwd: root });
  if (code !== 0)
    throw new Problem(`${whatFailed} (code ${code}); the reason is above. Correct it, then run the command again.`);
}

/** Brings the database to the shape this version needs. */
export function migrateDatabase(env) {
  return runProgram(migrateProgram, [], env, 'The database could not be migrated');
}

/**
 * Fills the database with the demo when it is empty, or, with `reset`, empties it first.
 * @returns the people of the demo who can sign in
 */
export async function seedDemo(env, { reset = false } = {}) {
  rmSync(paths.demoPeople, { force: true });
  await runProgram(demoProgram, reset ? ['--reset'] : [], env, 'The demo could not be made');
  const people = findJson(paths.demoPeople)?.demo;
  rmSync(paths.demoPeople, { force: true });
  if (!Array.isArray(people))
    throw new Problem(
      `The demo did not say who can sign in (${shownPath(paths.demoPeople)}). Make it anew with: npm run demo:reset`,
    );
  return people;
}
