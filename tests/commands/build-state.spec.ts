import { existsSync, mkdirSync, renameSync, utimesSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { removeOrphans } from '../../backend/scripts/lib/orphans.mjs';
import { hashSources } from '../../backend/scripts/lib/source-hash.mjs';
import { makeTemporaryFolder } from './temporary-folder.js';

function write(base: string, file: string, text = '') {
  mkdirSync(path.dirname(path.join(base, file)), { recursive: true });
  writeFileSync(path.join(base, file), text);
}

describe('hashSources', () => {
  it('changes with content and names, and with nothing else', () => {
    const base = makeTemporaryFolder();
    write(base, 'src/a.ts', 'one');
    const first = hashSources(base, ['src']);
    utimesSync(path.join(base, 'src/a.ts'), 1, 1);
    write(base, 'src/dist/a.js', 'built');
    write(base, 'src/node_modules/b/index.js', 'installed');
    expect(hashSources(base, ['src', 'missing'])).toBe(first);
    write(base, 'src/a.ts', 'two');
    const second = hashSources(base, ['src']);
    expect(second).not.toBe(first);
    renameSync(path.join(base, 'src/a.ts'), path.join(base, 'src/b.ts'));
    expect(hashSources(base, ['src'])).not.toBe(second);
  });
});

describe('removeOrphans', () => {
  it('removes what was built from a source that is gone, and leaves the rest', () => {
    const base = makeTemporaryFolder();
    write(base, 'src/kept.ts');
    for (const name of ['kept', 'migrations/gone']) {
      for (const ending of ['.js', '.js.map', '.d.ts']) write(base, `dist/${name}${ending}`);
    }
    write(base, 'dist/.tsbuildinfo');
    removeOrphans(base);
    expect(existsSync(path.join(base, 'dist/migrations/gone.js'))).toBe(false);
    expect(existsSync(path.join(base, 'dist/migrations/gone.d.ts'))).toBe(false);
    expect(existsSync(path.join(base, 'dist/kept.js.map'))).toBe(true);
    expect(existsSync(path.join(base, 'dist/.tsbuildinfo'))).toBe(true);
  });
});
