/** `npm start`: the whole demo system, from a fresh clone to a page in the browser. Ctrl-C ends all of it. */
import { printAddresses, removeAddresses, writeAddresses } from './lib/addresses.mjs';
import { ensureBuilt } from './lib/build.mjs';
import { runCommandLine, untilStopped } from './lib/lifetime.mjs';
import { choosePorts, startBackground, startServer } from './lib/local-system.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { loopback } from './lib/ports.mjs';
import { say } from './lib/problem.mjs';
import { openSession } from './lib/session.mjs';

async function start(lifetime) {
  checkPlatform();
  const { session, addresses: running } = await openSession(lifetime, 'npm start');
  if (running) {
    say('Holdwater is running already:');
    printAddresses(running);
    return 0;
  }
  await ensurePackages();
  await ensureBuilt(['server', 'page']);
  const ports = await choosePorts();
  const { urls, env, demo } = await startBackground(lifetime, session, ports);
  await startServer(lifetime, session, { ports, env });
  const web = `http://${loopback}:${ports.web}`;
  lifetime.onEnd(() => removeAddresses());
  const addresses = writeAddresses({ web, mailbox: `http://${loopback}:${ports.mailbox}`, database: urls.app, demo });
  session.markReady();
  say('\nHoldwater is ready. Ctrl-C stops it.');
  printAddresses(addresses);
  return untilStopped();
}

runCommandLine(start, { exitCodeWhenStopped: 0 });
