import { readFileSync, readlinkSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

const parentField = 4;
const startTicksField = 22;
const checkMs = 50;

function readProcFile(pid, name) {
  try {
    return readFileSync(`/proc/${pid}/${name}`, 'utf8');
  } catch {
    return null;
  }
}

/** The fields of /proc/…/stat from the third on, by their number in proc(5); null when there is no such process. */
function findStat(pid) {
  const stat = readProcFile(pid, 'stat');
  if (stat === null) return null;
  // The second field is the program's name in brackets and may hold spaces: count from behind it.
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  const isDead = fields[0] === 'Z' || fields[0] === 'X';
  return isDead ? null : (number) => Number(fields[number - 3]);
}

/**
 * When the process began, in clock ticks since boot (proc(5), stat field 22), or null when there is none. With the number of
 * the process it names one process for good, however often the system gives the number out again. Zombies do not count.
 */
export function findStartTicks(pid) {
  return findStat(pid)?.(startTicksField) ?? null;
}

/** The number of the process's parent, or null when there is no such process. */
export function findParent(pid) {
  return findStat(pid)?.(parentField) ?? null;
}

/** The process's command line with spaces between its words; empty when there is no such process. */
export function readCommandLine(pid) {
  return (readProcFile(pid, 'cmdline') ?? '').split('\0').join(' ').trim();
}

/** The folder a process works in, or null when there is no such process or it is not ours to ask about. */
export function findWorkingFolder(pid) {
  try {
    return path.resolve(readlinkSync(`/proc/${pid}/cwd`));
  } catch {
    return null;
  }
}

/** What to write down about a process to know it again later. `marker` is a part of its command line. */
export function describeProcess(pid, marker) {
  return { pid, startTicks: findStartTicks(pid), marker };
}

/** Whether the process written down earlier is still the one alive under its number. */
export function isSameProcess(record) {
  if (!record || !Number.isInteger(record.pid) || record.pid <= 1) return false;
  const startTicks = findStartTicks(record.pid);
  return startTicks !== null && startTicks === record.startTicks && readCommandLine(record.pid).includes(record.marker);
}

/** Waits until `isGone` or until the time is over; says whether it is gone. */
export async function waitUntilGone(isGone, limitMs) {
  const deadline = Date.now() + limitMs;
  while (!isGone()) {
    if (Date.now() > deadline) return false;
    await pause(checkMs);
  }
  return true;
}

/** Sends a signal to a process, or to its group with a negative number; a process already gone is no fault. */
export function signalProcess(pid, signal) {
  try {
    process.kill(pid, signal);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}
