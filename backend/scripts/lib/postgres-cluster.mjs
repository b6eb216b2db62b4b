import { chownSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { Problem } from './problem.mjs';
import { getRandomPort, loopback } from './ports.mjs';
import { getProgramFolder } from './postgres-programs.mjs';
import { startService } from './service.mjs';
import { runQuietly } from './spawning.mjs';

/** The superuser of every cluster these commands make. */
export const adminRole = 'holdwater_admin';

const startLimitMs = 120_000;
const stopLimitMs = 30_000;
const checkMs = 25;
/** The line of postmaster.pid that holds the server's state (PostgreSQL's pidfile.h, LOCK_FILE_LINE_PM_STATUS = 8). */
const statusLine = 8;

/** Only passwords, only over loopback; there is no socket to reach it by. */
const accessRules = `host all all ${loopback}/32 scram-sha-256\n`;

/**
 * Makes an empty cluster unless the folder holds one. It is made aside and moved into place, so that being killed half-way
 * leaves nothing that looks whole.
 * @param cluster { folder, user, adminPassword, isTemporary }
 */
export async function ensureCluster({ folder, user, adminPassword, isTemporary = false }) {
  if (existsSync(path.join(folder, 'PG_VERSION'))) return;
  const draft = `${folder}.new`;
  rmSync(draft, { recursive: true, force: true });
  mkdirSync(path.dirname(folder), { recursive: true });
  mkdirSync(draft, { mode: 0o700 });
  if (user) chownSync(draft, user.uid, user.gid);
  const options = ['--auth=reject', '--encoding=UTF8', '--locale=C.UTF-8', `--username=${adminRole}`, '-D', draft];
  const initdb = path.join(getProgramFolder(), 'initdb');
  const { code, output } = await runQuietly(initdb, isTemporary ? ['--no-sync', ...options] : options, {
    runAs: user,
    cwd: '/',
  });
  if (code !== 0)
    throw new Problem(
      `PostgreSQL could not make a database in ${folder}:\n\n${output}\n\nPut right what it says, then run the command again.`,
    );
  writeFileSync(path.join(draft, 'pg_hba.conf'), accessRules);
  await setAdminPassword({ folder: draft, user }, adminPassword);
  rmSync(folder, { recursive: true, force: true });
  renameSync(draft, folder);
}

function getClusterPrograms(folder) {
  return getProgramFolder(Number(readFileSync(path.join(folder, 'PG_VERSION'), 'utf8')));
}

/** Gives the superuser its password in single-user mode, which asks for none. The cluster must not be running. */
export async function setAdminPassword({ folder, user }, password) {
  const args = ['--single', '-D', folder, '-c', 'exit_on_error=on', '-c', 'unix_socket_directories=', 'postgres'];
  const input = `ALTER ROLE ${adminRole} PASSWORD '${password}';\n`;
  const { code, output } = await runQuietly(path.join(getClusterPrograms(folder), 'postgres'), args, {
    input,
    runAs: user,
    cwd: '/',
  });
  if (code !== 0 || output.includes('ERROR:'))
    throw new Problem(
      `PostgreSQL could not be prepared in ${folder}:\n\n${output}\n\nPut right what it says, then run the command again.`,
    );
}

/**
 * Starts the cluster on a loopback port and waits until it takes connections. It ends with the command.
 * @param cluster { folder, user, port, settings, logFolder }
 * @returns { port, service }
 */
export async function startCluster(lifetime, cluster) {
  const { folder, user, settings = [], logFolder } = cluster;
  const port = cluster.port ?? (await getRandomPort());
  const fixed = [
    `listen_addresses=${loopback}`,
    `port=${port}`,
    'unix_socket_directories=',
    'timezone=UTC',
    'log_timezone=UTC',
  ];
  const service = startService(lifetime, {
    name: 'database',
    command: path.join(getClusterPrograms(folder), 'postgres'),
    args: ['-D', folder, ...[...fixed, ...settings].flatMap((setting) => ['-c', setting])],
    cwd: '/',
    runAs: user,
    stopSignal: 'SIGINT', // PostgreSQL's "fast" shutdown
    stopWithinMs: stopLimitMs,
    logFolder,
  });
  await waitUntilReady(folder, service);
  return { port, service };
}

async function waitUntilReady(folder, service) {
  const deadline = Date.now() + startLimitMs;
  while (!isReady(folder, service.pid)) {
    if (Date.now() > deadline)
      throw new Problem(
        `PostgreSQL did not start within ${startLimitMs / 1000} seconds. Read ${service.logFile} for the reason.`,
      );
    await pause(checkMs);
  }
}

function isReady(folder, pid) {
  try {
    const lines = readFileSync(path.join(folder, 'postmaster.pid'), 'utf8').split('\n');
    return Number(lines[0]) === pid && lines[statusLine - 1]?.trim() === 'ready';
  } catch {
    return false;
  }
}
