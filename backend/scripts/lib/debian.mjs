import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { paths } from './paths.mjs';
import { Problem, say } from './problem.mjs';
import { withLock } from './lock.mjs';
import { runShown } from './spawning.mjs';

const clusterSettings = '/etc/postgresql-common/createcluster.d/holdwater.conf';

/**
 * Installs Debian packages when `isPresent` says no.
 * @throws Problem with the one command to run when this is not root, or when apt-get fails
 */
export async function ensureDebianPackages(what, packages, isPresent) {
  if (isPresent()) return;
  const byHand = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`;
  if (process.getuid() !== 0 || !existsSync('/usr/bin/apt-get')) {
    throw new Problem(
      `${what} is not installed on this machine. Install it with this command, then run npm again:\n\n    sudo sh -c '${byHand}'`,
    );
  }
  await withLock(
    path.join(paths.locks, 'install.lock'),
    'Another command is installing packages; waiting for it …',
    async () => {
      if (isPresent()) return;
      say(`Installing ${what} from Debian's packages …`);
      await withoutDefaultCluster(() => installWithApt(what, packages, byHand));
      if (!isPresent())
        throw new Problem(
          `${what} is still not found after its packages (${packages.join(', ')}) were installed. Check the output above.`,
        );
    },
  );
}

async function installWithApt(what, packages, byHand) {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const wait = ['-o', 'DPkg::Lock::Timeout=600', '-q'];
  const steps = [
    ['update', ...wait],
    ['install', '-y', '--no-install-recommends', ...wait, ...packages],
  ];
  for (const step of steps) {
    const code = await runShown('apt-get', step, { env });
    if (code !== 0)
      throw new Problem(
        `${what} could not be installed: apt-get ${step[0]} ended with ${code}. Its output is above. By hand:\n\n    ${byHand}`,
      );
  }
}

/** Debian's PostgreSQL starts a server of its own when it is installed; nobody asked for that one. */
async function withoutDefaultCluster(install) {
  mkdirSync(path.dirname(clusterSettings), { recursive: true });
  writeFileSync(clusterSettings, 'create_main_cluster = false\n');
  try {
    await install();
  } finally {
    rmSync(clusterSettings, { force: true });
  }
}
