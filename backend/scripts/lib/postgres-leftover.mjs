import { readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { Problem, say } from './problem.mjs';
import {
  findStartTicks,
  findWorkingFolder,
  readCommandLine,
  signalProcess,
  waitUntilGone,
} from './process-identity.mjs';

const fastLimitMs = 30_000;

function findRecordedPid(folder) {
  try {
    const pid = Number(readFileSync(path.join(folder, 'postmaster.pid'), 'utf8').split('\n')[0]);
    return Number.isInteger(pid) && pid > 1 ? pid : null;
  } catch {
    return null;
  }
}

/** PostgreSQL works in its data folder: with its name that says for sure that a process is this cluster's server. */
function isServerOf(folder, pid) {
  return (
    /(^|\/)(postgres|postmaster)( |$)/.test(readCommandLine(pid)) && findWorkingFolder(pid) === path.resolve(folder)
  );
}

/**
 * Ends what a killed run left of the cluster. The caller holds the session's lock, so no living command uses it.
 * A pid file whose number has gone to another program is removed: PostgreSQL would take that one for itself and refuse.
 */
export async function endLeftoverServer(folder) {
  const pid = findRecordedPid(folder);
  if (pid === null || findStartTicks(pid) === null) return;
  if (!isServerOf(folder, pid)) {
    rmSync(path.join(folder, 'postmaster.pid'), { force: true });
    return;
  }
  say('Stopping the database that an earlier run left behind …');
  const isGone = () => findStartTicks(pid) === null;
  for (const signal of ['SIGINT', 'SIGQUIT']) {
    signalProcess(pid, signal);
    if (await waitUntilGone(isGone, fastLimitMs)) return;
  }
  throw new Problem(
    `A database of an earlier run (process ${pid}) will not stop. Stop it by hand with: kill -QUIT ${pid}`,
  );
}
