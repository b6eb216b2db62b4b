import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, existsSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { describe, expect, it, vi } from 'vitest';
import { describeProcess } from '../../backend/scripts/lib/process-identity.mjs';
import { ready, stop, useCheckout } from './checkout-fixture.js';
import { listProcessesOf, readAddresses } from './command-run.js';

const checkout = useCheckout();
const addressesFile = () => path.join(checkout.folder, '.data/run/addresses.json');
const countBuilds = () => readFileSync(path.join(checkout.folder, 'builds.txt'), 'utf8').trim().split('\n').length;

/** The addresses on which something listens at these ports, as the kernel tells (proc(5), /proc/net/tcp). */
function listListeners(ports: number[]): string[] {
  const isListening = (fields: string[]) => fields[3] === '0A'; // TCP_LISTEN
  return ['/proc/net/tcp', '/proc/net/tcp6']
    .flatMap((table) => readFileSync(table, 'utf8').split('\n'))
    .map((line) => line.trim().split(/\s+/))
    .filter(isListening)
    .map((fields) => fields[1] ?? '')
    .filter((local) => ports.includes(parseInt(local.split(':')[1] ?? '', 16)));
}

describe('npm start', () => {
  it('writes the addresses, serves on loopback only, and leaves nothing behind after Ctrl-C', async () => {
    const command = await checkout.startReady();
    const { web, api, mailbox, database, demo } = readAddresses(checkout.folder);
    expect(statSync(addressesFile()).mode & 0o777).toBe(0o600);
    expect({ web, api }).toEqual({
      web: `http://127.0.0.1:${checkout.port}`,
      api: `http://127.0.0.1:${checkout.port}/api`,
    });
    expect(demo).toEqual([
      { email: 'ana@example.test', password: 'demo-word', role: 'desk', organization: 'Lakeview' },
    ]);
    const { role, environment } = await checkout.ask();
    expect(role).toBe('holdwater_app');
    expect(environment).toMatchObject({ HOLDWATER_MODE: 'demo', HOST: '127.0.0.1', DATABASE_URL: database, TZ: 'UTC' });
    expect(environment).not.toHaveProperty('DATABASE_MIGRATION_URL');
    const smtp = environment['SMTP_URL'] ?? '';
    const listeners = listListeners(
      [web, mailbox, database, smtp].map((url) => Number(url.split(':').at(-1)?.split('/')[0])),
    );
    expect(listeners).toHaveLength(4);
    // 127.0.0.1 in hexadecimal, in the machine's byte order.
    for (const listener of listeners) expect(listener).toMatch(/^0100007F:/);
    expect(await stop(command)).toBe(0);
    expect(command.output()).toMatch(/demo-word/);
    expect(existsSync(addressesFile())).toBe(false);
    expect(listProcessesOf(checkout.folder)).toEqual([]);
  });

  it('prints the running addresses for a second start, and keeps data and builds for a later one', async () => {
    const first = await checkout.startReady();
    const { id } = await checkout.ask();
    const second = checkout.run('start.mjs');
    expect(await second.ended).toBe(0);
    expect(second.output()).toContain(`http://127.0.0.1:${checkout.port}/api`);
    expect(second.output()).not.toMatch(ready);
    await stop(first);
    const builds = countBuilds();
    await checkout.startReady();
    expect((await checkout.ask()).id).toBe(id);
    expect(countBuilds()).toBe(builds);
  });

  it('starts once when two come at the same instant', async () => {
    const both = [checkout.run('start.mjs'), checkout.run('start.mjs')];
    const early = await Promise.race(both.map(async (command) => ({ command, code: await command.ended })));
    expect(early.code).toBe(0);
    expect(early.command.output()).toContain('Holdwater is running already');
    expect(both.filter((command) => ready.test(command.output()))).toHaveLength(1);
    expect((await checkout.ask()).role).toBe('holdwater_app');
  });

  it('moves on from a port in use, with a word about it', async () => {
    const other = net.createServer();
    await new Promise<void>((resolve) => other.listen({ host: '127.0.0.1', port: checkout.port }, resolve));
    const command = await checkout.startReady();
    expect(command.output()).toMatch(new RegExp(`Port ${checkout.port} is in use; the page is on port \\d+ instead`));
    expect(readAddresses(checkout.folder).web).not.toBe(`http://127.0.0.1:${checkout.port}`);
    await stop(command);
    await new Promise((resolve) => other.close(resolve));
  });

  it('cleans up after a start that was killed with kill -9, and has all data', async () => {
    const killed = await checkout.startReady();
    const { id } = await checkout.ask();
    killed.signal('SIGKILL');
    await killed.ended;
    expect(existsSync(addressesFile())).toBe(true); // nobody was left to remove it
    await checkout.startReady();
    expect((await checkout.ask()).id).toBe(id);
  });

  it('ends what a killed run wrote down, and only when it is still the same process', async () => {
    await stop(await checkout.startReady());
    const [left, stranger] = ['1000001', '1000002'].map((seconds) => spawn('sleep', [seconds], { detached: true }));
    const record = (pid = 0, marker = '') => ({ name: 'server', ...describeProcess(pid, marker) });
    const owner = { pid: 2 ** 22 + 1, startTicks: 1, marker: 'npm start' }; // above the kernel's PID_MAX_LIMIT, proc(5)
    const processes = [record(left?.pid, '1000001'), { ...record(stranger?.pid, '1000002'), startTicks: 1 }];
    const session = { owner, command: 'npm start', isReady: true, processes };
    writeFileSync(path.join(checkout.folder, '.data/run/session.json'), JSON.stringify(session));
    const command = await checkout.startReady();
    expect(command.output()).toContain(`process ${left?.pid}`);
    expect(left?.signalCode).toBe('SIGTERM');
    expect(stranger?.signalCode).toBeNull();
    stranger?.kill('SIGKILL');
  });

  it('starts although the database left a pid file whose number another program has now', async () => {
    await stop(await checkout.startReady());
    writeFileSync(path.join(checkout.folder, '.data/postgres/postmaster.pid'), `${process.pid}\n`);
    await checkout.startReady();
    expect((await checkout.ask()).role).toBe('holdwater_app');
  });

  it.runIf(process.getuid?.() === 0)(
    'puts the database elsewhere, and says where, when its user cannot get there',
    async () => {
      chmodSync(checkout.folder, 0o700);
      const command = await checkout.startReady();
      const place =
        /Making a database in (\/var\/lib\/holdwater-[0-9a-f]{12})\/postgres/.exec(command.output())?.[1] ?? '';
      expect(existsSync(path.join(place, 'postgres/PG_VERSION'))).toBe(true);
      await stop(command);
      expect(listProcessesOf(place)).toEqual([]);
      rmSync(place, { recursive: true });
    },
  );

  it('gets by without the secrets file, which a person may have deleted', async () => {
    const first = await checkout.startReady();
    const { id } = await checkout.ask();
    await stop(first);
    rmSync(path.join(checkout.folder, '.data/secrets.json'));
    await checkout.startReady();
    expect((await checkout.ask()).id).toBe(id);
  });

  it('ends everything with exit 1 and the last log lines when the server dies', async () => {
    const command = await checkout.startReady();
    await fetch(`${readAddresses(checkout.folder).api}/crash`).catch(() => undefined);
    expect(await command.ended).toBe(1);
    expect(command.output()).toMatch(/The server ended unexpectedly \(code 3\)/);
    expect(command.output()).toContain('a line of the server');
    expect(existsSync(addressesFile())).toBe(false);
    expect(listProcessesOf(checkout.folder)).toEqual([]);
  });

  it.each(['SIGTERM', 'SIGKILL'] as const)('ends everything when npm gets %s', async (signal) => {
    const command = checkout.run('start');
    await command.until(ready);
    command.signal(signal);
    await vi.waitFor(() => expect(listProcessesOf(checkout.folder)).toEqual([]), { timeout: 20_000 });
    expect(existsSync(addressesFile())).toBe(false);
  });

  it('ends everything in order on Ctrl-C in a terminal', async () => {
    // script(1) makes the terminal; its line discipline turns the character 3 into SIGINT for npm, shell and command alike.
    const env = { ...process.env, PORT: String(checkout.port), NODE_ENV: '' };
    const terminal = spawn('script', ['-qfec', 'npm start', '/dev/null'], { cwd: checkout.folder, env });
    const ended = once(terminal, 'close');
    let output = '';
    terminal.stdout.on('data', (chunk: Buffer) => void (output += chunk.toString()));
    await vi.waitFor(() => expect(output).toMatch(ready), { timeout: 120_000 });
    terminal.stdin.write('\x03');
    await ended;
    await vi.waitFor(() => expect(listProcessesOf(checkout.folder)).toEqual([]), { timeout: 20_000 });
    expect(existsSync(addressesFile())).toBe(false);
    const databaseLog = readFileSync(path.join(checkout.folder, '.data/log/database.log'), 'utf8');
    expect(databaseLog).toContain('database system is shut down');
  });

  it('says what is wrong with PORT', async () => {
    const command = checkout.run('start.mjs', { PORT: 'web' });
    expect(await command.ended).toBe(1);
    expect(command.output()).toMatch(/PORT is "web".*Give a whole number/s);
  });
});
