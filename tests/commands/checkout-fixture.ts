import { afterEach, beforeEach, expect, vi } from 'vitest';
import { getRandomPort } from '../../backend/scripts/lib/ports.mjs';
import { listProcessesOf, readAddresses, runCommand, type CommandRun } from './command-run.js';
import { makeStandInCheckout } from './stand-in-checkout.js';

/** What the stand-in server answers: who it is in the database, what it found there, and its environment. */
export interface Answer {
  id: string;
  role: string;
  environment: Record<string, string>;
}

/** What `npm start` prints when all is up. */
export const ready = /Holdwater is ready/;

/** A stand-in checkout per test; after each, everything begun in it is stopped and nothing may be left of it. */
export function useCheckout() {
  const fixture = { folder: '', port: 0, run, startReady, ask };
  const runs: CommandRun[] = [];
  let remove = () => {};

  function run(script: string, env: NodeJS.ProcessEnv = {}) {
    const command = runCommand(fixture.folder, script, { PORT: String(fixture.port), NODE_ENV: '', ...env });
    runs.push(command);
    return command;
  }

  async function startReady() {
    const command = run('start.mjs');
    await command.until(ready);
    return command;
  }

  async function ask() {
    const response = await fetch(`${readAddresses(fixture.folder).api}/ready`);
    return (await response.json()) as Answer;
  }

  // Real starts and stops of PostgreSQL, on a machine that may be busy with other tests.
  vi.setConfig({ testTimeout: 240_000, hookTimeout: 240_000 });

  beforeEach(async () => {
    const checkout = makeStandInCheckout();
    fixture.folder = checkout.folder;
    remove = checkout.remove;
    fixture.port = await getRandomPort();
  });

  afterEach(async () => {
    for (const command of runs.splice(0)) await stop(command, 'SIGTERM');
    await vi.waitFor(() => expect(listProcessesOf(fixture.folder)).toEqual([]), { timeout: 20_000 });
    remove();
  });

  return fixture;
}

/** Signals a command and waits for its end; returns its exit code. */
export async function stop(command: CommandRun, signal: NodeJS.Signals = 'SIGINT') {
  command.signal(signal);
  return command.ended;
}
