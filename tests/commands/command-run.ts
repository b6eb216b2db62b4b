import { spawn } from 'node:child_process';
import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import type { Addresses } from '../../backend/scripts/lib/addresses.mjs';

export interface CommandRun {
  pid: number;
  output: () => string;
  /** Resolves when the output matches; rejects when the command ends without. */
  until: (pattern: RegExp) => Promise<void>;
  ended: Promise<number | string>;
  signal: (signal: NodeJS.Signals) => void;
}

/** Runs one of the commands in a checkout: a file straight, any other name through npm. */
export function runCommand(
  folder: string,
  script: string,
  env: NodeJS.ProcessEnv = {},
  args: string[] = [],
): CommandRun {
  const isFile = script.endsWith('.mjs');
  const words = isFile ? [path.join(folder, 'backend/scripts', script), ...args] : ['run', script, ...args];
  const child = spawn(isFile ? process.execPath : 'npm', words, {
    cwd: folder,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  const keep = (chunk: Buffer) => void (output += chunk.toString());
  child.stdout.on('data', keep);
  child.stderr.on('data', keep);
  const ended = new Promise<number | string>((resolve) =>
    child.once('close', (code, signal) => resolve(code ?? signal ?? '')),
  );
  const until = (pattern: RegExp) =>
    new Promise<void>((resolve, reject) => {
      const look = () => void (pattern.test(output) && resolve());
      child.stdout.on('data', look);
      child.stderr.on('data', look);
      void ended.then((code) => reject(new Error(`ended with ${code} before ${pattern.source}:\n${output}`)));
      look();
    });
  return { pid: child.pid ?? 0, output: () => output, until, ended, signal: (signal) => void child.kill(signal) };
}

/** The addresses a running system wrote down. */
export function readAddresses(folder: string): Addresses {
  return JSON.parse(readFileSync(path.join(folder, '.data/run/addresses.json'), 'utf8')) as Addresses;
}

/** Command lines of all living processes that have to do with a folder: it is in their words, or they work in it. */
export function listProcessesOf(folder: string): string[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .map((pid) => {
      try {
        return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').join(' ');
      } catch {
        return ''; // ended meanwhile
      }
    })
    .filter((line) => line.includes(folder));
}
