import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import path from 'node:path';

const builtFolders = new Set(['node_modules', 'dist', 'dist-types', 'coverage', '.data']);

/** Every file below a folder, or the file itself, relative to `base`, without what builds and installs leave there. */
export function listFiles(base, place) {
  const full = path.join(base, place);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [place];
  return readdirSync(full, { withFileTypes: true })
    .filter((entry) => !builtFolders.has(entry.name))
    .flatMap((entry) => {
      const inner = path.join(place, entry.name);
      if (entry.isDirectory()) return listFiles(base, inner);
      return entry.isFile() ? [inner] : [];
    });
}

/** One hash over the names and contents of all files in these places: the same sources give the same hash on any day. */
export function hashSources(base, places) {
  const hash = createHash('sha256');
  for (const file of places.flatMap((place) => listFiles(base, place)).sort()) {
    const content = readFileSync(path.join(base, file));
    hash.update(`${file}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}
