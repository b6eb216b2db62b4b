import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { createServer } from 'node:net';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../../..', import.meta.url));
const main = `${root}backend/dist/main.js`;
/** Where the built page lies; another place when a run says so. */
const staticDir = process.env.TEST_STATIC_DIR ?? `${root}frontend/dist`;
const readyWithinMs = 120_000;

export interface Served {
  url: string;
  /** Ends the process; resolves when it is gone. */
  stop(): Promise<void>;
}

/** Starts the built server with the built page as a process of its own. @throws with its log when it does not get ready */
export async function serve(environment: Record<string, string>): Promise<Served> {
  for (const path of [main, `${staticDir}/index.html`]) {
    if (!existsSync(path)) throw new Error(`${path} is not there: build before the browser tests (npm test does)`);
  }
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const child = spawn(process.execPath, [main], {
    cwd: root,
    env: {
      PATH: process.env.PATH,
      NODE_ENV: 'production',
      HOLDWATER_MODE: 'demo',
      ROLE: 'all',
      TZ: 'UTC',
      LOG_LEVEL: 'warn',
      MAIL_FROM: 'visits@example.test',
      PORT: String(port),
      APP_URL: url,
      STATIC_DIR: staticDir,
      ...environment,
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let log = '';
  const keep = (chunk: Buffer): void => void (log = (log + chunk.toString()).slice(-20_000));
  child.stdout.on('data', keep);
  child.stderr.on('data', keep);
  const hasEnded = (): boolean => child.exitCode !== null || child.signalCode !== null;
  const stop = async (): Promise<void> => {
    if (hasEnded()) return;
    const ended = once(child, 'exit');
    child.kill('SIGTERM');
    const impatience = setTimeout(() => child.kill('SIGKILL'), 10_000);
    await ended;
    clearTimeout(impatience);
  };
  try {
    await untilReady(url, hasEnded);
  } catch (error) {
    await stop();
    throw new Error(`the server did not get ready; its log ends:\n${log}`, { cause: error });
  }
  return { url, stop };
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await once(probe, 'listening');
  const address = probe.address();
  probe.close();
  await once(probe, 'close');
  if (address === null || typeof address === 'string') throw new Error('no port was given');
  return address.port;
}

async function untilReady(url: string, hasEnded: () => boolean): Promise<void> {
  const until = Date.now() + readyWithinMs;
  while (Date.now() < until) {
    if (hasEnded()) throw new Error('it ended before it was ready');
    const answer = await fetch(`${url}/api/ready`).catch(() => null);
    if (answer?.ok) return;
    // Between two questions to a starting process, not a wait for something to have happened.
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error('it was not ready in time');
}
