import path from 'node:path';
import { rmSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';
import { findAddresses, removeAddresses } from './addresses.mjs';
import { findJson, writePrivateJson } from './json-file.mjs';
import { tryLock } from './lock.mjs';
import { paths, prepareDataFolders } from './paths.mjs';
import { say } from './problem.mjs';
import { describeProcess, isSameProcess, readCommandLine, signalProcess, waitUntilGone } from './process-identity.mjs';

const retryMs = 200;
const patienceMs = 1_000;
const stopLimitMs = 10_000;

/**
 * Becomes the one command that runs this checkout's local system, or finds the one that does. The owner holds a lock of the
 * kernel's as long as it lives; a command that comes while the owner is getting ready waits until it is ready or has failed.
 * @param command what the person typed, to tell others
 * @returns { session } for the owner, or { addresses } of the one that runs
 */
export async function openSession(lifetime, command) {
  prepareDataFolders();
  const since = Date.now();
  let told = false;
  for (;;) {
    const release = await tryLock(path.join(paths.locks, 'session.lock'));
    if (release) return { session: await beginSession(lifetime, command, release) };
    const other = findJson(paths.session);
    if (other && isSameProcess(other.owner)) {
      const addresses = other.isReady ? findAddresses() : null;
      if (addresses) return { addresses };
      if (!told && Date.now() - since > patienceMs) {
        say(
          `Another command (${other.command}, process ${other.owner.pid}) is using the local system; waiting until it is ready or done …`,
        );
        told = true;
      }
    }
    await pause(retryMs);
  }
}

async function beginSession(lifetime, command, release) {
  lifetime.onEnd(release);
  await endLeftovers(findJson(paths.session));
  removeAddresses();
  const record = {
    owner: describeProcess(process.pid, readCommandLine(process.pid)),
    command,
    isReady: false,
    processes: [],
  };
  const write = () => writePrivateJson(paths.session, record);
  write();
  lifetime.onEnd(() => rmSync(paths.session, { force: true }));
  return {
    /** Writes a started process down, for the next command to end should this one be killed. */
    remember(service, marker) {
      record.processes.push({ name: service.name, ...describeProcess(service.pid, marker) });
      write();
    },
    markReady() {
      record.isReady = true;
      write();
    },
  };
}

/** Ends the processes that a killed command left behind: only those it wrote down, and only when they are still the same. */
async function endLeftovers(record) {
  const left = (record?.processes ?? []).filter(isSameProcess).reverse();
  for (const entry of left) {
    say(`Stopping the ${entry.name} (process ${entry.pid}) that an earlier run left behind …`);
    signalProcess(entry.pid, 'SIGTERM');
    const isGone = await waitUntilGone(() => !isSameProcess(entry), stopLimitMs);
    if (!isGone) signalProcess(-entry.pid, 'SIGKILL');
  }
}
