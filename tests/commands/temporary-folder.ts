import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach } from 'vitest';

const made: string[] = [];

/** A folder for one test, removed after it. */
export function makeTemporaryFolder(): string {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'holdwater-commands-'));
  made.push(folder);
  return folder;
}

afterEach(() => {
  for (const folder of made.splice(0)) rmSync(folder, { recursive: true, force: true });
});
