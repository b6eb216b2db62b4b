import { rmSync } from 'node:fs';
import { findJson, writePrivateJson } from './json-file.mjs';
import { paths } from './paths.mjs';
import { say } from './problem.mjs';

/** The addresses of the running system, or null when none is written down. */
export function findAddresses(file = paths.addresses) {
  return findJson(file);
}

/** Writes down where everything runs and who can sign in, readable by this person only. */
export function writeAddresses({ web, mailbox, database, demo }, file = paths.addresses) {
  const addresses = { web, api: `${web}/api`, mailbox, database, demo };
  writePrivateJson(file, addresses);
  return addresses;
}

/** Takes the addresses away again, when the system ends. */
export function removeAddresses(file = paths.addresses) {
  rmSync(file, { force: true });
}

/** The sign-ins as lines of a table; the password once when all share it. */
export function formatSignIns(demo) {
  if (demo.length === 0) return ['There are no demo sign-ins.'];
  const passwords = new Set(demo.map(({ password }) => password));
  const shared = passwords.size === 1;
  const columns = demo.map(({ role, email, organization, password }) => [
    role,
    email,
    organization ?? '',
    shared ? '' : password,
  ]);
  const widths = [0, 1, 2].map((index) => Math.max(...columns.map((column) => column[index].length)));
  const rows = columns.map((column) =>
    `  ${column.map((text, index) => text.padEnd(widths[index] ?? 0)).join('  ')}`.trimEnd(),
  );
  return shared ? [`Sign in with the password  ${[...passwords][0]}  as`, '', ...rows] : ['Sign in as', '', ...rows];
}

/** Prints the addresses and the demo sign-ins. */
export function printAddresses({ web, api, mailbox, demo }) {
  const lines = ['', `  Page     ${web}`, `  API      ${api}`, `  Mailbox  ${mailbox}`, '', ...formatSignIns(demo), ''];
  for (const line of lines) say(line);
}
