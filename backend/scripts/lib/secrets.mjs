import { randomBytes } from 'node:crypto';
import { findJson, writePrivateJson } from './json-file.mjs';
import { paths } from './paths.mjs';

const names = ['adminPassword', 'ownerPassword', 'appPassword', 'jwtSecret'];

/** A fresh secret of 256 bits, in characters that need no quoting in SQL or in a URL. */
export function createSecret() {
  return randomBytes(32).toString('hex');
}

/**
 * The secrets of this checkout's local system.
 * @returns { secrets, areKept }: those kept in the secrets file, or new ones, not kept yet
 */
export function getSecrets() {
  const kept = findJson(paths.secrets) ?? {};
  const areKept = names.every((name) => typeof kept[name] === 'string');
  const missing = names.filter((name) => typeof kept[name] !== 'string');
  return { secrets: { ...kept, ...Object.fromEntries(missing.map((name) => [name, createSecret()])) }, areKept };
}

/** Keeps them in a file only its owner can read. */
export function keepSecrets(secrets) {
  writePrivateJson(paths.secrets, secrets);
}
