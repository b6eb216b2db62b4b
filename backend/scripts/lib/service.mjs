import { closeSync, existsSync, openSync, readFileSync, renameSync } from 'node:fs';
import path from 'node:path';
import { paths, shownPath } from './paths.mjs';
import { Problem } from './problem.mjs';
import { signalProcess, waitUntilGone } from './process-identity.mjs';
import { spawnBound } from './spawning.mjs';

const shownLogLines = 20;

/**
 * Starts a program that runs beside this command until the end. Its output goes to a log file; when it ends by itself, the
 * whole command fails and shows the log's last lines.
 * @param lifetime the command's lifetime, which ends the service
 * @param service { name, command, args, env, cwd, runAs, stopSignal, stopWithinMs, logFolder }
 */
export function startService(lifetime, service) {
  const { name, command, args, stopSignal = 'SIGTERM', stopWithinMs = 10_000, logFolder = paths.logs } = service;
  const logFile = path.join(logFolder, `${name}.log`);
  const log = openFreshLog(logFile);
  // Its own process group, so that Ctrl-C reaches this command only, which then stops everything in the right order.
  const child = spawnBound(command, args, {
    cwd: service.cwd,
    env: service.env,
    runAs: service.runAs,
    deathSignal: stopSignal.replace('SIG', ''),
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  const running = { name, pid: child.pid, logFile, hasEnded: false };
  let stopping = false;
  child.once('error', (error) => lifetime.fail(error));
  child.once('exit', (code, signal) => {
    running.hasEnded = true;
    if (!stopping && !lifetime.ending) lifetime.fail(describeEnd(running, signal ?? `code ${code}`));
  });
  running.stop = async () => {
    stopping = true;
    if (!child.pid) return;
    if (!running.hasEnded) signalProcess(child.pid, stopSignal);
    await waitUntilGone(() => running.hasEnded, stopWithinMs);
    // What is left of the group: the program itself when it would not stop, or what it began and forgot.
    signalProcess(-child.pid, 'SIGKILL');
    await waitUntilGone(() => running.hasEnded, stopWithinMs);
  };
  lifetime.onEnd(running.stop);
  return running;
}

function openFreshLog(logFile) {
  if (existsSync(logFile)) renameSync(logFile, logFile.replace(/\.log$/, '.before.log'));
  return openSync(logFile, 'a', 0o600);
}

function describeEnd({ name, logFile }, how) {
  const lines = readFileSync(logFile, 'utf8').trimEnd().split('\n').slice(-shownLogLines);
  return new Problem(
    `The ${name} ended unexpectedly (${how}). Its last lines, from ${shownPath(logFile)}:\n\n` +
      `${lines.map((line) => `    ${line}`).join('\n')}\n\nEverything else is being stopped. Put right what the lines say, then start again.`,
  );
}
