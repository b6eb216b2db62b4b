import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { findMissingPackages, type LockFile } from '../../backend/scripts/lib/packages.mjs';

const root = path.resolve(import.meta.dirname, '../..');
const readLock = (file: string) => JSON.parse(readFileSync(path.join(root, file), 'utf8')) as LockFile;

// npm's documentation of package-lock.json: `packages` maps places to what is there; "Hidden Lockfiles" in node_modules.
describe('findMissingPackages', () => {
  const lock: LockFile = {
    packages: {
      '': {},
      backend: { version: '0.1.0' },
      'node_modules/a': { version: '1.0.0' },
      'node_modules/for-another-machine': { version: '1.0.0', optional: true },
    },
  };

  it('finds everything missing where nothing was installed', () => {
    expect(findMissingPackages(lock, null)).toEqual(['node_modules/a']);
  });

  it('finds another version', () => {
    expect(findMissingPackages(lock, { packages: { 'node_modules/a': { version: '0.9.0' } } })).toEqual([
      'node_modules/a',
    ]);
  });

  it('is content without an optional package of another machine', () => {
    expect(findMissingPackages(lock, { packages: { 'node_modules/a': { version: '1.0.0' } } })).toEqual([]);
  });

  it('finds nothing missing after npm itself installed this checkout', () => {
    expect(findMissingPackages(readLock('package-lock.json'), readLock('node_modules/.package-lock.json'))).toEqual([]);
  });
});
