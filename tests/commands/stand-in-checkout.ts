import { chmodSync, cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import os from 'node:os';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '../..');
const pgModule = JSON.stringify(createRequire(import.meta.url).resolve('pg'));

/**
 * A small checkout around the real commands: compilers that write the programs below, and programs that keep the contract of
 * the real ones (variables, routes, signals) in a few lines. The database is a real PostgreSQL.
 */
const programs: Record<string, string> = {
  'backend/dist/main.js': `
    const { Client } = require(${pgModule});
    process.stdout.write('a line of the server\\n');
    require('node:http').createServer(async (request, response) => {
      if (request.url === '/api/crash') process.exit(3);
      const client = new Client(process.env.DATABASE_URL);
      await client.connect();
      const { rows } = await client.query('select id, current_user as role from marker');
      await client.end();
      response.end(JSON.stringify({ ...rows[0], environment: process.env }));
    }).listen(Number(process.env.PORT), process.env.HOST);
  `,
  'backend/dist/database/migrate.cli.js': `
    const { Client } = require(${pgModule});
    (async () => {
      const client = new Client(process.env.DATABASE_MIGRATION_URL);
      await client.connect();
      await client.query('create extension if not exists btree_gist; create extension if not exists intarray');
      await client.query('create table if not exists marker (id uuid primary key default gen_random_uuid())');
      await client.query('grant select, insert, delete on marker to ' + new URL(process.env.DATABASE_URL).username);
      await client.end();
    })();
  `,
  'backend/dist/database/demo/demo.cli.js': `
    const { Client } = require(${pgModule});
    (async () => {
      const client = new Client(process.env.DATABASE_URL);
      await client.connect();
      if (process.argv.includes('--reset')) await client.query('delete from marker');
      await client.query('insert into marker select gen_random_uuid() where not exists (select from marker)');
      await client.end();
      const demo = [{ email: 'ana@example.test', password: 'demo-word', role: 'desk', organization: 'Lakeview' }];
      require('node:fs').writeFileSync(process.env.DEMO_PEOPLE_FILE, JSON.stringify({ demo }));
    })();
  `,
  'fake-services/dist/mailbox/main.js': `
    require('node:http').createServer((request, response) => response.end()).listen(Number(process.env.MAILBOX_PORT), '127.0.0.1');
    require('node:net').createServer().listen(Number(process.env.SMTP_PORT), '127.0.0.1');
  `,
};

/** A test runner that asks the test database who it is, and reports what the file report.json in the checkout says. */
const testRunner = `
  const { Client } = require(${pgModule});
  const { copyFileSync, existsSync } = require('node:fs');
  (async () => {
    const client = new Client(process.env.TEST_DATABASE_ADMIN_URL);
    await client.connect();
    const { rows } = await client.query('select rolcreatedb and rolcreaterole as may from pg_roles where rolname = current_user');
    await client.end();
    console.log('may make databases and roles:', rows[0].may, 'filters:', process.argv.filter((word) => word.startsWith('only-')).join());
    if (existsSync('wait')) setInterval(() => {}, 1e6);
    const target = process.argv.find((word) => word.startsWith('--outputFile.json=')).split('=')[1];
    copyFileSync('report.json', target);
  })();
`;

const page = { 'frontend/dist/index.html': '<!doctype html>' };

function write(folder: string, files: Record<string, string>) {
  for (const [name, text] of Object.entries(files)) {
    mkdirSync(path.dirname(path.join(folder, name)), { recursive: true });
    writeFileSync(path.join(folder, name), text);
  }
}

/** A compiler that writes files, and one line into builds.txt to count it by; it watches, or serves the page, when asked. */
function compilerOf(folder: string, files: Record<string, string>): string {
  return `
    const { appendFileSync, mkdirSync, writeFileSync } = require('node:fs');
    appendFileSync(${JSON.stringify(path.join(folder, 'builds.txt'))}, 'built\\n');
    for (const [name, text] of Object.entries(${JSON.stringify(files)})) {
      const file = ${JSON.stringify(folder)} + '/' + name;
      mkdirSync(require('node:path').dirname(file), { recursive: true });
      writeFileSync(file, text);
    }
    const option = (name) => process.argv[process.argv.indexOf(name) + 1];
    if (process.argv.includes('-w')) setInterval(() => {}, 1e6);
    if (process.argv.includes('--port')) {
      require('node:http').createServer(async (request, response) => {
        const answer = request.url.startsWith('/api/') && await fetch(process.env.API_URL + request.url);
        response.end(answer ? await answer.text() : '');
      }).listen(Number(option('--port')), option('--host'));
    }
  `;
}

/** Makes the checkout; `remove` takes it away again. */
export function makeStandInCheckout() {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'holdwater-checkout-'));
  chmodSync(folder, 0o755); // as a clone is: the database's user may pass through
  cpSync(path.join(root, 'backend/scripts'), path.join(folder, 'backend/scripts'), { recursive: true });
  write(folder, {
    'package-lock.json': '{ "lockfileVersion": 3, "packages": {} }',
    'node_modules/.package-lock.json': '{ "packages": {} }',
    'package.json': readFileSync(path.join(root, 'package.json'), 'utf8'),
    'backend/dist/package.json': '{}', // the stand-ins are CommonJS
    'fake-services/dist/package.json': '{}',
    'node_modules/.bin/tsc': compilerOf(folder, programs),
    'node_modules/.bin/vite': compilerOf(folder, page),
    'node_modules/.bin/eslint': `process.exit(require('node:fs').existsSync('lint-fault') ? 1 : 0);`,
    'node_modules/.bin/vitest': testRunner,
    'frontend/src/app.tsx': '',
    'backend/src/main.ts': '',
    'backend/src/database/migrate.cli.ts': '',
    'backend/src/database/demo/demo.cli.ts': '',
    'fake-services/src/mailbox/main.ts': '',
  });
  return { folder, remove: () => rmSync(folder, { recursive: true, force: true }) };
}
