import path from 'node:path';
import { migrateDatabase, seedDemo } from './database-commands.mjs';
import { getDatabaseEnvironment } from './local-environment.mjs';
import { startLocalDatabase } from './local-database.mjs';
import { paths, root } from './paths.mjs';
import { getChosenPort, getFreePort, loopback } from './ports.mjs';
import { say } from './problem.mjs';
import { waitForAnswer } from './readiness.mjs';
import { startService } from './service.mjs';

const defaultWebPort = 4310;

/**
 * Chooses the ports, from the web port up; the web port moves on, with a word about it, when it is in use.
 * @returns { web, server, mailbox, smtp }; `server` is `web` unless the page gets a server of its own
 */
export async function choosePorts({ pageHasOwnServer = false } = {}) {
  const wanted = getChosenPort(process.env.PORT, defaultWebPort);
  const web = await getFreePort(wanted);
  if (web !== wanted) say(`Port ${wanted} is in use; the page is on port ${web} instead.`);
  const taken = [web];
  const next = async () => {
    const port = await getFreePort(web + 1, taken);
    taken.push(port);
    return port;
  };
  const mailbox = await next();
  const smtp = await next();
  return { web, mailbox, smtp, server: pageHasOwnServer ? await next() : web };
}

/** Starts the fake mailbox. */
async function startMailbox(lifetime, session, ports, env) {
  const program = path.join(root, 'fake-services/dist/mailbox/main.js');
  const service = startService(lifetime, {
    name: 'mailbox',
    command: process.execPath,
    args: [program],
    env: { ...env, SMTP_PORT: String(ports.smtp), MAILBOX_PORT: String(ports.mailbox), MAILBOX_DIR: paths.mailbox },
  });
  session.remember(service, program);
  await waitForAnswer(service, `http://${loopback}:${ports.mailbox}/api/health`);
}

/**
 * Starts database and mailbox, migrates, and fills an empty database with the demo: all that the server needs.
 * @returns { urls, env, demo }; `env` is for the server
 */
export async function startBackground(lifetime, session, ports) {
  const { web, mailbox, smtp, server } = ports;
  const local = await startLocalDatabase(lifetime, { firstPort: web + 1, takenPorts: [web, mailbox, smtp, server] });
  const { DATABASE_MIGRATION_URL, DEMO_PEOPLE_FILE, ...env } = getDatabaseEnvironment({ ...local, ports });
  const databaseEnv = { ...env, DATABASE_MIGRATION_URL, DEMO_PEOPLE_FILE };
  await migrateDatabase(databaseEnv);
  const demo = await seedDemo(databaseEnv);
  await startMailbox(lifetime, session, ports, env);
  return { urls: local.urls, env, demo };
}

/** Starts the server and waits until it is ready. */
export async function startServer(lifetime, session, { ports, env, nodeOptions = [] }) {
  const program = path.join(root, 'backend/dist/main.js');
  const args = [...nodeOptions, program];
  const service = startService(lifetime, { name: 'server', command: process.execPath, args, env });
  session.remember(service, program);
  await waitForAnswer(service, `http://${loopback}:${ports.server}/api/ready`);
}
