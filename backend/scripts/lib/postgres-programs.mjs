import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { ensureDebianPackages } from './debian.mjs';
import { Problem } from './problem.mjs';

const debianFolder = '/usr/lib/postgresql';
/** Below 15 the owner of a database may not create tables in its public schema without more ado. */
const oldestVersion = 15;

/** The installed PostgreSQL server versions that can be used, newest first. */
export function listPostgresVersions() {
  if (!existsSync(debianFolder)) return [];
  return readdirSync(debianFolder)
    .map(Number)
    .filter((version) => version >= oldestVersion)
    .filter((version) =>
      ['postgres', 'initdb', 'psql'].every((name) => existsSync(path.join(debianFolder, String(version), 'bin', name))),
    )
    .sort((a, b) => b - a);
}

/** Installs PostgreSQL when no version that can be used is there. */
export function ensurePostgres() {
  return ensureDebianPackages('PostgreSQL', ['postgresql'], () => listPostgresVersions().length > 0);
}

/**
 * The folder with the programs of one version, by default the newest.
 * @throws Problem when that version is not installed
 */
export function getProgramFolder(version = listPostgresVersions()[0]) {
  if (version !== undefined && listPostgresVersions().includes(version))
    return path.join(debianFolder, String(version), 'bin');
  throw new Problem(
    `The database in use was made by PostgreSQL ${version}, which is not installed (found: ${listPostgresVersions().join(', ') || 'none'}). ` +
      `Install it with: sudo apt-get install -y postgresql-${version}`,
  );
}
