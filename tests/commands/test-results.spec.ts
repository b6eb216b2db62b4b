import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { countTestResults, formatTotals, type Report } from '../../backend/scripts/lib/test-results.mjs';
import { makeTemporaryFolder } from './temporary-folder.js';

const vitest = path.resolve(import.meta.dirname, '../../node_modules/vitest/vitest.mjs');

/** Runs the real vitest on these files: the report's shape is vitest's, not ours. */
function runVitest(files: Record<string, string>) {
  const folder = makeTemporaryFolder();
  mkdirSync(path.join(folder, 'specs'));
  for (const [name, text] of Object.entries(files)) writeFileSync(path.join(folder, 'specs', name), text);
  const report = path.join(folder, 'report.json');
  const args = ['run', '--root', folder, '--globals', '--reporter=json', `--outputFile.json=${report}`];
  const { status } = spawnSync(process.execPath, [vitest, ...args], { cwd: folder, encoding: 'utf8' });
  return { report: JSON.parse(readFileSync(report, 'utf8')) as Report, exitCode: status ?? 1 };
}

describe('countTestResults', () => {
  it('counts passed and failed tests, broken files, and names what is skipped', () => {
    const { report, exitCode } = runVitest({
      'mixed.spec.js': `it('a', () => {}); it('b', () => expect(1).toBe(2)); it.skip('left out', () => {}); it.todo('to come');`,
      'broken.spec.js': `import './not-there.js'; it('never runs', () => {});`,
    });
    const counted = countTestResults(report, exitCode);
    expect(counted).toMatchObject({ passed: 1, failed: 2 });
    expect(counted.skipped).toHaveLength(2);
    expect(counted.skipped.join()).toMatch(/mixed\.spec\.js: left out.*mixed\.spec\.js: to come/);
  });

  it('counts no failure where all pass', () => {
    const { report, exitCode } = runVitest({ 'good.spec.js': `it('a', () => {});` });
    expect(countTestResults(report, exitCode)).toEqual({ passed: 1, failed: 0, skipped: [] });
  });

  it('counts an error outside of any test, a missing report and an empty run as a failure', () => {
    const { report, exitCode } = runVitest({
      'late.spec.js': `it('a', () => { void Promise.reject(new Error('unseen')); });`,
    });
    expect(countTestResults(report, exitCode)).toMatchObject({ passed: 1, failed: 1 });
    expect(countTestResults(null, 0)).toMatchObject({ passed: 0, failed: 1 });
    expect(countTestResults({ testResults: [] }, 1)).toMatchObject({ passed: 0, failed: 1 });
  });
});

describe('formatTotals', () => {
  it('names skipped tests only where there are some', () => {
    expect(formatTotals({ passed: 3, failed: 0, skipped: 0 })).toBe('3 passed, 0 failed');
    expect(formatTotals({ passed: 3, failed: 1, skipped: 2 })).toBe('3 passed, 1 failed, 2 skipped');
  });
});
