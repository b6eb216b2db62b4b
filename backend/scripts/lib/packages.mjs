import { existsSync } from 'node:fs';
import path from 'node:path';
import { findJson } from './json-file.mjs';
import { withLock } from './lock.mjs';
import { paths, root } from './paths.mjs';
import { Problem, say } from './problem.mjs';
import { runShown } from './spawning.mjs';

/**
 * Packages of the lock file that are not installed, or in another version. npm writes down what it installed as its last
 * step, so an installation cut short shows as nothing installed. Optional packages may be for another kind of machine.
 * @param lock content of package-lock.json
 * @param installed content of node_modules/.package-lock.json, or null
 */
export function findMissingPackages(lock, installed) {
  const present = installed?.packages ?? {};
  return Object.entries(lock.packages)
    .filter(([place, wanted]) => {
      if (!place.includes('node_modules/')) return false;
      const found = present[place];
      return found ? found.version !== wanted.version : !wanted.optional;
    })
    .map(([place]) => place);
}

function areInstalled() {
  const lock = findJson(path.join(root, 'package-lock.json'));
  if (!lock)
    throw new Problem('package-lock.json is missing or damaged. Restore it from the repository, then run npm again.');
  return findMissingPackages(lock, findJson(path.join(root, 'node_modules/.package-lock.json'))).length === 0;
}

/**
 * Installs the npm packages when they are missing or not those of the lock file.
 * @throws Problem when npm fails
 */
export async function ensurePackages() {
  if (areInstalled()) return;
  await withLock(
    path.join(paths.locks, 'install.lock'),
    'Another command is installing packages; waiting for it …',
    async () => {
      if (areInstalled()) return;
      say('Installing npm packages (about a minute) …');
      // Development packages too, whatever NODE_ENV says: they build the server and the page.
      const args = ['ci', '--ignore-scripts', '--include=dev', '--no-audit', '--no-fund'];
      const npm = process.env.npm_execpath;
      const isNpm = npm !== undefined && /npm-cli\.c?js$/.test(npm) && existsSync(npm);
      const code = isNpm
        ? await runShown(process.execPath, [npm, ...args], { cwd: root })
        : await runShown('npm', args, { cwd: root });
      if (code !== 0)
        throw new Problem(
          `npm ci ended with ${code}; its output is above. Check the connection to the npm registry, then run the command again.`,
        );
      if (!areInstalled())
        throw new Problem(
          'npm ci ran, but packages of package-lock.json are still missing. Remove node_modules and run the command again.',
        );
    },
  );
}
