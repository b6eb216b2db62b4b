import { createHash } from 'node:crypto';
import { existsSync, statSync } from 'node:fs';
import path from 'node:path';
import { paths, root, shownPath } from './paths.mjs';
import { Problem } from './problem.mjs';
import { runQuietly } from './spawning.mjs';

/** PostgreSQL refuses root. As root it runs as Debian's postgres user; else as the person who runs the command (null). */
export async function findPostgresUser() {
  if (process.getuid() !== 0) return null;
  const answers = await Promise.all(['-u', '-g'].map((option) => runQuietly('id', [option, 'postgres'])));
  if (answers.some(({ code }) => code !== 0)) {
    throw new Problem(
      'This machine has no user "postgres", which Debian\'s PostgreSQL brings along. Run: apt-get install --reinstall -y postgresql-common',
    );
  }
  const [uid, gid] = answers.map(({ output }) => Number(output));
  return { uid, gid };
}

/** Whether the user may pass through the folder and all above it. */
export async function canPassThrough(user, folder) {
  if (!user) return true;
  const { code } = await runQuietly('test', ['-x', folder], { runAs: user, cwd: '/' });
  return code === 0;
}

/** Where the checkout's database lives: in `.data`, or under /var/lib when the database's user cannot get there. */
export async function getClusterFolder(user) {
  if (await canPassThrough(user, paths.data)) return paths.postgres;
  const hash = createHash('sha256').update(root).digest('hex').slice(0, 12);
  return `/var/lib/holdwater-${hash}/postgres`;
}

/**
 * Who must run the database in `folder`: the owner of its files when it exists already.
 * @throws Problem when those files belong to someone this person cannot become
 */
export function getClusterUser(user, folder) {
  if (!existsSync(path.join(folder, 'PG_VERSION'))) return user;
  const { uid, gid } = statSync(folder);
  if (process.getuid() === 0) return { uid, gid };
  if (uid === process.getuid()) return null;
  throw new Problem(
    `The database in ${shownPath(folder)} belongs to another user (number ${uid}), most likely because it was made as root. ` +
      'Run the command as root again, or remove the folder .data as root to start with an empty database.',
  );
}
