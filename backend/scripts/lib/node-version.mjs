import { Problem } from './problem.mjs';

/**
 * Refuses a Node.js this product is not made for, and systems other than Linux.
 * @throws Problem
 */
export function checkPlatform(version = process.versions.node, platform = process.platform) {
  const [major, minor] = version.split('.').map(Number);
  const isFit = (major === 20 && minor >= 12) || major >= 22;
  if (!isFit)
    throw new Problem(
      `Node.js ${version} is too old or an odd release. Install Node.js 20.12 or later of 20, or 22 or later, and run the command again.`,
    );
  if (platform !== 'linux')
    throw new Problem(
      `These commands are made for Debian Linux, and this is ${platform}. Run them on Debian (in a virtual machine or container).`,
    );
}
