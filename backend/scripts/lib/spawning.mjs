import { spawn } from 'node:child_process';
import { signalProcess, waitUntilGone } from './process-identity.mjs';

const politeLimitMs = 10_000;

/**
 * Starts a program that the kernel signals when this process dies, even by kill -9: nothing stays behind.
 * @param options.runAs { uid, gid } to become first (root only)
 * @param options.deathSignal what the program gets when this process dies
 */
export function spawnBound(command, args, { runAs, deathSignal = 'TERM', ...options } = {}) {
  const identity = runAs ? [`--reuid=${runAs.uid}`, `--regid=${runAs.gid}`, '--clear-groups'] : [];
  return spawn('setpriv', [...identity, '--pdeathsig', deathSignal, '--', command, ...args], options);
}

/** Runs a program to its end with its output shown; resolves with its exit code. */
export function runShown(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawnBound(command, args, { stdio: ['ignore', 'inherit', 'inherit'], ...options });
    child.once('error', reject);
    child.once('exit', (code) => resolve(code ?? 1));
  });
}

/** Runs a program to its end with its output kept; resolves with { code, output } where output holds both streams. */
export function runQuietly(command, args, { input, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawnBound(command, args, { stdio: ['pipe', 'pipe', 'pipe'], ...options });
    let output = '';
    const keep = (chunk) => {
      output += chunk;
    };
    child.stdout.setEncoding('utf8').on('data', keep);
    child.stderr.setEncoding('utf8').on('data', keep);
    child.once('error', reject);
    child.once('close', (code) => resolve({ code: code ?? 1, output: output.trim() }));
    // A program that ends without reading its input is judged by its exit code.
    child.stdin.on('error', () => {});
    child.stdin.end(input ?? '');
  });
}

/**
 * Runs a program that starts others (a test runner, say) to its end with its output shown, in a process group of its own:
 * when the command is stopped, or the program has ended, nothing of the group is left.
 * @returns its exit code
 */
export function runInGroup(lifetime, command, args, options = {}) {
  const child = spawnBound(command, args, { stdio: ['ignore', 'inherit', 'inherit'], detached: true, ...options });
  let hasEnded = false;
  lifetime.onEnd(async () => {
    if (!child.pid) return;
    if (!hasEnded) signalProcess(child.pid, 'SIGINT');
    await waitUntilGone(() => hasEnded, politeLimitMs);
    signalProcess(-child.pid, 'SIGKILL');
    await waitUntilGone(() => hasEnded, politeLimitMs);
  });
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) => {
      hasEnded = true;
      resolve(code ?? 1);
    });
  });
}
