/** `npm run dev`: as `npm start`, but what you change is compiled and shown at once, on both sides. */
import path from 'node:path';
import { printAddresses, removeAddresses, writeAddresses } from './lib/addresses.mjs';
import { ensureBuilt, getTool } from './lib/build.mjs';
import { runCommandLine, untilStopped } from './lib/lifetime.mjs';
import { choosePorts, startBackground, startServer } from './lib/local-system.mjs';
import { followLog } from './lib/log-follower.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { paths, root } from './lib/paths.mjs';
import { loopback } from './lib/ports.mjs';
import { say } from './lib/problem.mjs';
import { waitForAnswer } from './lib/readiness.mjs';
import { startService } from './lib/service.mjs';
import { openSession } from './lib/session.mjs';

const frontend = path.join(root, 'frontend');

function startTool(lifetime, session, service) {
  const tool = getTool(service.tool, service.cwd);
  const started = startService(lifetime, { ...service, command: process.execPath, args: [tool, ...service.args] });
  session.remember(started, tool);
  return started;
}

async function startPage(lifetime, session, ports, env) {
  const web = `http://${loopback}:${ports.web}`;
  const args = ['--host', loopback, '--port', String(ports.web), '--strictPort', '--clearScreen', 'false'];
  const pageEnv = { ...env, API_URL: `http://${loopback}:${ports.server}` };
  const page = startTool(lifetime, session, { name: 'page', tool: 'vite', cwd: frontend, args, env: pageEnv });
  await waitForAnswer(page, `${web}/`);
  return web;
}

async function develop(lifetime) {
  checkPlatform();
  const { session, addresses: running } = await openSession(lifetime, 'npm run dev');
  if (running) {
    say('Holdwater is running already. To develop, stop it first (Ctrl-C there). It is at:');
    printAddresses(running);
    return 0;
  }
  await ensurePackages();
  await ensureBuilt(['server']);
  const ports = await choosePorts({ pageHasOwnServer: true });
  const { urls, env, demo } = await startBackground(lifetime, session, ports);
  const projects = ['shared-types', 'fake-services', 'backend'];
  startTool(lifetime, session, {
    name: 'compiler',
    tool: 'tsc',
    cwd: root,
    args: ['-b', '-w', '--preserveWatchOutput', ...projects],
    env,
  });
  await startServer(lifetime, session, { ports, env, nodeOptions: ['--watch', '--watch-preserve-output'] });
  const web = await startPage(lifetime, session, ports, env);
  lifetime.onEnd(() => removeAddresses());
  const addresses = writeAddresses({ web, mailbox: `http://${loopback}:${ports.mailbox}`, database: urls.app, demo });
  session.markReady();
  say('\nHoldwater is ready and watches your changes. Ctrl-C stops it.');
  printAddresses(addresses);
  for (const name of ['compiler', 'server', 'page']) followLog(lifetime, name, path.join(paths.logs, `${name}.log`));
  return untilStopped();
}

runCommandLine(develop, { exitCodeWhenStopped: 0 });
