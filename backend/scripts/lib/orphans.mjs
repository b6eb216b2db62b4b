import { existsSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';

const output = /(\.d\.ts\.map|\.js\.map|\.d\.ts|\.js)$/;

/**
 * Removes built files whose source is gone: TypeScript leaves them, and a renamed migration would run under both its names.
 * @param workspace folder with `src` and `dist`
 */
export function removeOrphans(workspace) {
  const dist = path.join(workspace, 'dist');
  if (!existsSync(dist)) return;
  for (const entry of readdirSync(dist, { withFileTypes: true, recursive: true })) {
    const file = path.join(entry.parentPath ?? entry.path, entry.name);
    if (!entry.isFile() || !output.test(file)) continue;
    const source = path.join(workspace, 'src', path.relative(dist, file).replace(output, ''));
    if (!existsSync(`${source}.ts`) && !existsSync(`${source}.tsx`)) rmSync(file);
  }
}
