import { existsSync } from 'node:fs';
import path from 'node:path';
import { findJson, writePrivateJson } from './json-file.mjs';
import { withLock } from './lock.mjs';
import { removeOrphans } from './orphans.mjs';
import { paths, root } from './paths.mjs';
import { Problem, say } from './problem.mjs';
import { hashSources } from './source-hash.mjs';
import { runShown } from './spawning.mjs';

const serverWorkspaces = ['shared-types', 'fake-services', 'backend'];
const commonSources = ['package-lock.json', 'tsconfig.base.json', 'tsconfig.json'];

/** What can be built, from which sources, into what. */
const parts = {
  server: {
    title: 'server',
    sources: [
      ...commonSources,
      ...serverWorkspaces.flatMap((name) => [`${name}/src`, `${name}/package.json`, `${name}/tsconfig.json`]),
    ],
    products: ['backend/dist/main.js', 'fake-services/dist/mailbox/main.js'],
    build: () => compile(serverWorkspaces),
  },
  page: {
    title: 'page',
    sources: [...commonSources, 'shared-types/src', 'shared-types/package.json', 'frontend'],
    products: ['frontend/dist/index.html'],
    build: () => runTool('vite', ['build', '--logLevel', 'warn'], path.join(root, 'frontend'), { NODE_ENV: 'production' }),
  },
};

/**
 * The full path of a tool of an npm package.
 * @throws Problem when the packages are not installed
 */
export function getTool(name, folder = root) {
  const places = [folder, root].map((place) => path.join(place, 'node_modules/.bin', name));
  const found = places.find((place) => existsSync(place));
  if (found) return found;
  throw new Problem(
    `The npm packages are not installed (${name} is missing). Run: npm ci --ignore-scripts --include=dev`,
  );
}

/** Runs an npm package's tool with its output shown; resolves with its exit code. */
export function runTool(name, args, folder = root, extraEnv = {}) {
  return runShown(process.execPath, [getTool(name, folder), ...args], {
    cwd: folder,
    env: { ...process.env, ...extraEnv },
  });
}

/** Compiles (and so type-checks) the projects given and those they refer to. */
function compile(projects) {
  for (const name of serverWorkspaces) removeOrphans(path.join(root, name));
  return runTool('tsc', ['-b', ...projects]);
}

/** Whether everything the part consists of is there, whatever it was built from. */
export function isBuilt(partName) {
  return parts[partName].products.every((product) => existsSync(path.join(root, product)));
}

function isCurrent(partName, hash) {
  return isBuilt(partName) && findJson(paths.builds)?.[partName] === hash;
}

function recordBuild(partName, hash) {
  writePrivateJson(paths.builds, { ...findJson(paths.builds), [partName]: hash });
}

/** Runs `work` while no other command builds in this checkout. */
function withBuildLock(work) {
  return withLock(path.join(paths.locks, 'build.lock'), 'Another command is building; waiting for it …', work);
}

/** The state of the sources of a part, to compare with what was built. */
export function hashPart(partName) {
  return hashSources(root, parts[partName].sources);
}

/**
 * Builds the parts whose sources changed since they were built.
 * @throws Problem when a build fails; its output has been shown
 */
export function ensureBuilt(partNames) {
  return withBuildLock(async () => {
    for (const partName of partNames) {
      const hash = hashPart(partName);
      if (isCurrent(partName, hash)) continue;
      say(`Building the ${parts[partName].title} …`);
      const code = await parts[partName].build();
      if (code !== 0 || !isBuilt(partName)) {
        throw new Problem(
          `The ${parts[partName].title} could not be built (code ${code}); the reason is above. Correct it, then run the command again.`,
        );
      }
      recordBuild(partName, hash);
    }
  });
}

/** Type-checks every workspace, which builds the server too; says whether all is well. */
export function typecheckAll() {
  return withBuildLock(async () => {
    const hash = hashPart('server');
    const code = await compile(['tsconfig.json']);
    if (code === 0 && isBuilt('server')) recordBuild('server', hash);
    return code === 0;
  });
}
