import { spawn, spawnSync } from 'node:child_process';
import { once } from 'node:events';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { getLock, tryLock, withLock } from '../../backend/scripts/lib/lock.mjs';
import { makeTemporaryFolder } from './temporary-folder.js';

const lockModule = path.resolve(import.meta.dirname, '../../backend/scripts/lib/lock.mjs');

// flock(1) and flock(2) are the reference: util-linux' own program must see the same lock.
const isLockedForFlock = (file: string) => spawnSync('flock', ['-n', file, 'true']).status !== 0;

describe('tryLock', () => {
  it('gives the lock to one at a time', async () => {
    const file = path.join(makeTemporaryFolder(), 'a.lock');
    const release = await tryLock(file);
    expect(release).not.toBeNull();
    expect(isLockedForFlock(file)).toBe(true);
    expect(await tryLock(file)).toBeNull();
    await release?.();
    expect(isLockedForFlock(file)).toBe(false);
  });

  it('respects a lock that flock holds', async () => {
    const file = path.join(makeTemporaryFolder(), 'a.lock');
    const holder = spawn('flock', [file, 'sh', '-c', 'echo locked; exec cat'], { stdio: ['pipe', 'pipe', 'ignore'] });
    await once(holder.stdout, 'data');
    expect(await tryLock(file)).toBeNull();
    holder.stdin.end();
    await once(holder, 'exit');
    const release = await tryLock(file);
    expect(release).not.toBeNull();
    await release?.();
  });

  it('lets one of twenty takers at the same instant have it', async () => {
    const file = path.join(makeTemporaryFolder(), 'a.lock');
    const releases = await Promise.all(Array.from({ length: 20 }, () => tryLock(file)));
    const winners = releases.filter((release) => release !== null);
    expect(winners).toHaveLength(1);
    await winners[0]?.();
  });

  it('is free again when its owner is killed with kill -9', async () => {
    const file = path.join(makeTemporaryFolder(), 'a.lock');
    const script = `const { tryLock } = await import(${JSON.stringify(lockModule)}); await tryLock(${JSON.stringify(file)}); console.log('has it'); setInterval(() => {}, 1e6);`;
    const owner = spawn(process.execPath, ['--input-type=module', '-e', script], {
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    await once(owner.stdout, 'data');
    expect(await tryLock(file)).toBeNull();
    owner.kill('SIGKILL');
    const release = await getLock(file, 'waiting');
    expect(isLockedForFlock(file)).toBe(true);
    await release();
  });
});

describe('withLock', () => {
  it('runs one after the other and frees the lock when the work fails', async () => {
    const file = path.join(makeTemporaryFolder(), 'a.lock');
    const events: string[] = [];
    const work = (name: string) => async () => {
      events.push(`${name} in`);
      await new Promise((resolve) => setImmediate(resolve));
      events.push(`${name} out`);
    };
    await Promise.all([withLock(file, 'waiting', work('a')), withLock(file, 'waiting', work('b'))]);
    expect(events.map((event) => event.slice(2))).toEqual(['in', 'out', 'in', 'out']);
    expect(events[0]?.[0]).toBe(events[1]?.[0]);
    await expect(withLock(file, 'waiting', () => Promise.reject(new Error('no')))).rejects.toThrow('no');
    expect(isLockedForFlock(file)).toBe(false);
  });
});
