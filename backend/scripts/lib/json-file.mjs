import { readFileSync, renameSync, writeFileSync } from 'node:fs';

/** The file's content, or null when the file is missing or is not JSON (say, cut off by a power failure). */
export function findJson(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    if (error.code === 'ENOENT' || error.code === 'ENOTDIR' || error instanceof SyntaxError) return null;
    throw error;
  }
}

/** Writes a file only its owner can read, in one step: a reader sees the old content or the new, never half of it. */
export function writePrivateJson(file, value) {
  const draft = `${file}.${process.pid}.tmp`;
  writeFileSync(draft, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600 });
  renameSync(draft, file);
}
