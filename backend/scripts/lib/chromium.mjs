import { existsSync } from 'node:fs';
import { ensureDebianPackages } from './debian.mjs';
import { Problem } from './problem.mjs';

const debianProgram = '/usr/bin/chromium';

/**
 * The browser for tests: the one named by CHROMIUM_PATH, else Debian's, which is installed when missing.
 * @throws Problem when there is none
 */
export async function getChromium() {
  const chosen = process.env.CHROMIUM_PATH;
  if (chosen) {
    if (existsSync(chosen)) return chosen;
    throw new Problem(
      `CHROMIUM_PATH names ${chosen}, which is not there. Correct it, or leave it out to use Debian's Chromium.`,
    );
  }
  await ensureDebianPackages('Chromium', ['chromium', 'fonts-liberation'], () => existsSync(debianProgram));
  return debianProgram;
}
