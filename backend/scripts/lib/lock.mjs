import { spawn } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { say } from './problem.mjs';

const busyCode = 75;
const retryMs = 200;
const patienceMs = 1_000;

/**
 * Takes the lock, or returns null when someone else has it.
 *
 * The kernel keeps the lock (flock) for a small helper process that lives as long as its input is open, which is as long as
 * this process lives. So a killed command never leaves a stale lock, and no two can take over the same one.
 * @returns a function that gives the lock back, or null
 */
export function tryLock(file) {
  mkdirSync(path.dirname(file), { recursive: true });
  const holder = ['-n', '-E', String(busyCode), file, 'sh', '-c', 'echo locked; exec cat >/dev/null'];
  // A group of its own: Ctrl-C must not take the lock away before this process has put things in order.
  const helper = spawn('flock', holder, { stdio: ['pipe', 'pipe', 'inherit'], detached: true, cwd: '/' });
  return new Promise((resolve, reject) => {
    helper.once('error', reject);
    helper.once('exit', (code) => {
      if (code === busyCode) resolve(null);
      else reject(new Error(`flock ended with ${code} for ${file}`));
    });
    helper.stdout.once('data', () => {
      for (const handle of [helper, helper.stdin, helper.stdout]) handle.unref();
      resolve(() => releaseHelper(helper));
    });
  });
}

function releaseHelper(helper) {
  if (helper.exitCode !== null || helper.signalCode !== null) return Promise.resolve();
  helper.ref();
  const ended = new Promise((resolve) => helper.once('exit', () => resolve()));
  helper.stdin.end();
  return ended;
}

/** Takes the lock, waiting for its present owner; says so once the wait is long enough to wonder about. */
export async function getLock(file, waitingMessage) {
  const since = Date.now();
  let told = false;
  for (;;) {
    const release = await tryLock(file);
    if (release) return release;
    if (!told && Date.now() - since > patienceMs) {
      say(waitingMessage);
      told = true;
    }
    await pause(retryMs);
  }
}

/** Runs `work` while holding the lock. */
export async function withLock(file, waitingMessage, work) {
  const release = await getLock(file, waitingMessage);
  try {
    return await work();
  } finally {
    await release();
  }
}
