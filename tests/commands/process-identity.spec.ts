import { spawn, spawnSync } from 'node:child_process';
import { once } from 'node:events';
import { describe, expect, it } from 'vitest';
import { checkPlatform } from '../../backend/scripts/lib/node-version.mjs';
import { describeProcess, findStartTicks, isSameProcess } from '../../backend/scripts/lib/process-identity.mjs';

describe('process identity', () => {
  it('knows a living process, by number, start and command line together', async () => {
    const child = spawn('sleep', ['1000']);
    await once(child, 'spawn');
    const record = describeProcess(child.pid ?? 0, '1000');
    expect(isSameProcess(record)).toBe(true);
    expect(isSameProcess({ ...record, startTicks: (record.startTicks ?? 0) + 1 })).toBe(false);
    expect(isSameProcess({ ...record, marker: 'another' })).toBe(false);
    child.kill('SIGKILL');
    await once(child, 'exit');
    expect(isSameProcess(record)).toBe(false);
  });

  it('never takes a group, process 1 or nothing for a process to end', () => {
    expect(isSameProcess(null)).toBe(false);
    for (const pid of [-1, 0, 1]) expect(isSameProcess({ pid, startTicks: findStartTicks(1), marker: '' })).toBe(false);
  });

  // proc(5): field 22 of stat is the start in clock ticks since boot; awk reads it independently for a name without spaces.
  it('reads the start that awk reads', () => {
    const { stdout } = spawnSync('awk', ['{ print $22 }', `/proc/${process.ppid}/stat`], { encoding: 'utf8' });
    expect(findStartTicks(process.ppid)).toBe(Number(stdout));
  });
});

describe('checkPlatform', () => {
  // The ranges of "engines" in package.json.
  it.each(['20.12.0', '20.20.2', '22.0.0', '24.1.0'])('takes Node.js %s', (version) =>
    expect(() => checkPlatform(version, 'linux')).not.toThrow(),
  );
  it.each(['18.20.0', '20.11.1', '21.7.0'])('refuses Node.js %s', (version) =>
    expect(() => checkPlatform(version, 'linux')).toThrow(/Install Node/),
  );
  it('refuses another system', () => expect(() => checkPlatform('20.12.0', 'darwin')).toThrow(/Debian/));
});
