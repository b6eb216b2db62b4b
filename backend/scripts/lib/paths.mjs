import { chmodSync, mkdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The top folder of this checkout. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../..');

const dataFolder = path.join(root, '.data');

/** Where the commands keep what must outlive them; all of it is git-ignored. */
export const paths = {
  data: dataFolder,
  postgres: path.join(dataFolder, 'postgres'),
  secrets: path.join(dataFolder, 'secrets.json'),
  builds: path.join(dataFolder, 'build.json'),
  mailbox: path.join(dataFolder, 'mailbox'),
  demoPeople: path.join(dataFolder, 'run', 'demo-people.json'),
  logs: path.join(dataFolder, 'log'),
  locks: path.join(dataFolder, 'lock'),
  run: path.join(dataFolder, 'run'),
  addresses: path.join(dataFolder, 'run', 'addresses.json'),
  session: path.join(dataFolder, 'run', 'session.json'),
};

/** The path as a person in the checkout would type it. */
export function shownPath(file) {
  const relative = path.relative(root, file);
  return relative.startsWith('..') ? file : relative;
}

/** Makes `.data` and its folders. The database's user must be able to pass through `.data`, and need not list it. */
export function prepareDataFolders() {
  for (const folder of [paths.data, paths.logs, paths.locks, paths.run]) mkdirSync(folder, { recursive: true });
  chmodSync(paths.data, 0o711);
  for (const folder of [paths.logs, paths.locks, paths.run]) chmodSync(folder, 0o700);
}
