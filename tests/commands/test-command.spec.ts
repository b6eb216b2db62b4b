import { mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { listProcessesOf, runCommand } from './command-run.js';
import { makeStandInCheckout } from './stand-in-checkout.js';

vi.setConfig({ testTimeout: 240_000, hookTimeout: 240_000 });

const report = (...statuses: string[]) =>
  JSON.stringify({
    testResults: [
      { name: 'a.spec.ts', status: 'passed', assertionResults: statuses.map((status) => ({ status, title: status })) },
    ],
  });
const lastLine = (output: string) => output.trimEnd().split('\n').at(-1);
let checkout: ReturnType<typeof makeStandInCheckout>;
let temporary: string;

function run(script: string, env: NodeJS.ProcessEnv = {}, args: string[] = []) {
  return runCommand(checkout.folder, script, { TMPDIR: temporary, NODE_ENV: '', ...env }, args);
}

beforeEach(() => {
  checkout = makeStandInCheckout();
  temporary = path.join(checkout.folder, 'tmp');
  mkdirSync(temporary);
});

afterEach(async () => {
  await vi.waitFor(() => expect(listProcessesOf(checkout.folder)).toEqual([]), { timeout: 20_000 });
  checkout.remove();
});

describe('npm test', () => {
  it('gives the tests a database, passes filters on, and prints the total last', async () => {
    writeFileSync(path.join(checkout.folder, 'report.json'), report('passed', 'passed', 'skipped'));
    const command = run('test.mjs', {}, ['only-this']);
    expect(await command.ended).toBe(0);
    expect(command.output()).toContain('may make databases and roles: true filters: only-this');
    expect(command.output()).toContain('Skipped: a.spec.ts: skipped');
    // two tests, and three checks beside them: types, page, lint
    expect(lastLine(command.output())).toBe('5 passed, 0 failed, 1 skipped');
    expect(readdirSync(temporary)).toEqual([]);
  });

  it('counts a failed check and a failed test, and exits with 1', async () => {
    writeFileSync(path.join(checkout.folder, 'report.json'), report('passed', 'failed'));
    writeFileSync(path.join(checkout.folder, 'lint-fault'), '');
    const command = run('test.mjs');
    expect(await command.ended).toBe(1);
    expect(command.output()).toContain('Failed: Lint');
    expect(lastLine(command.output())).toBe('3 passed, 2 failed');
  });

  it('runs twice at once', async () => {
    writeFileSync(path.join(checkout.folder, 'report.json'), report('passed'));
    const both = [run('test.mjs'), run('test.mjs')];
    expect(await Promise.all(both.map(({ ended }) => ended))).toEqual([0, 0]);
    for (const { output } of both) expect(lastLine(output())).toBe('4 passed, 0 failed');
  });

  it.each(['SIGINT', 'SIGKILL'] as const)('leaves no process behind after %s', async (signal) => {
    writeFileSync(path.join(checkout.folder, 'wait'), '');
    const command = run('test.mjs');
    await command.until(/may make databases/);
    command.signal(signal);
    expect(await command.ended).not.toBe(0);
    await vi.waitFor(() => expect(listProcessesOf(checkout.folder)).toEqual([]), { timeout: 20_000 });
    if (signal === 'SIGINT') expect(readdirSync(temporary)).toEqual([]);
  });
});

describe('npm run serve', () => {
  it('builds what is missing, passes the environment and the exit code on, and starts nothing else', async () => {
    // RFC 2606 section 2: no name under .invalid exists, so the server ends by itself.
    const command = run('serve.mjs', { HOST: 'nowhere.invalid', PORT: '4310' });
    expect(await command.ended).toBe(1);
    expect(command.output()).toContain('a line of the server');
    expect(command.output()).not.toContain('Mailbox');
    expect(readdirSync(path.join(checkout.folder, '.data'))).not.toContain('postgres');
  });
});
