import { chmodSync, existsSync, lstatSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { findJson, writePrivateJson } from './json-file.mjs';
import { canPassThrough } from './postgres-user.mjs';
import { describeProcess, isSameProcess, readCommandLine } from './process-identity.mjs';

const prefix = 'holdwater-test-';
const youngMs = 60_000;

/** Removes folders of test runs that were killed: ours, with an owner written down that is no more. */
function removeAbandoned(base) {
  for (const name of readdirSync(base).filter((entry) => entry.startsWith(prefix))) {
    const folder = path.join(base, name);
    const stat = lstatSync(folder, { throwIfNoEntry: false });
    if (!stat?.isDirectory() || stat.uid !== process.getuid() || Date.now() - stat.ctimeMs < youngMs) continue;
    const owner = findJson(path.join(folder, 'owner.json'));
    if (!isSameProcess(owner)) rmSync(folder, { recursive: true, force: true });
  }
}

/** A fresh folder for one test run, where the database's user can get to its part. It is removed at the end. */
export async function makeTestFolder(lifetime, user) {
  const bases = [os.tmpdir(), '/tmp', '/var/tmp'].filter((base) => existsSync(base));
  let base = bases[0];
  for (const candidate of bases) {
    if (await canPassThrough(user, candidate)) {
      base = candidate;
      break;
    }
  }
  removeAbandoned(base);
  const folder = mkdtempSync(path.join(base, prefix));
  lifetime.onEnd(() => rmSync(folder, { recursive: true, force: true }));
  chmodSync(folder, 0o711);
  writePrivateJson(path.join(folder, 'owner.json'), describeProcess(process.pid, readCommandLine(process.pid)));
  return folder;
}
