import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { vi } from 'vitest';
import { findFreePort } from './free-port.js';

const entry = fileURLToPath(new URL('../../backend/dist/main.js', import.meta.url));

/** How long a server may take to come up or to end, ms. Generous: the machine may be busy. */
export const patienceMs = 120_000;

/** A built server as a process of its own. */
export interface ServerProcess {
  url: string;
  /** Everything it wrote so far. */
  output: () => string;
  /** Resolves with the exit code, or the signal that ended it. */
  ended: Promise<number | string>;
  /** Asks it to end, and waits until it has; one that will not is killed, and that is an error. */
  stop: () => Promise<void>;
  /** Ends it at once, as a power cut would, and waits until it is gone. */
  kill: () => Promise<void>;
}

/** Runs the built server with this environment and no other variable, and does not wait for it to serve. */
export function spawnServer(env: Record<string, string>, url = ''): ServerProcess {
  const child = spawn(process.execPath, [entry], {
    env: { PATH: process.env.PATH ?? '', TZ: 'UTC', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  const keep = (chunk: Buffer) => void (output += chunk.toString());
  child.stdout.on('data', keep);
  child.stderr.on('data', keep);
  const ended = new Promise<number | string>((resolve, reject) => {
    child.once('error', reject);
    child.once('close', (code, signal) => resolve(code ?? signal ?? ''));
  });
  const endBy = async (signal: NodeJS.Signals) => {
    if (child.exitCode !== null || child.signalCode !== null) return;
    child.kill(signal);
    const limit = setTimeout(() => child.kill('SIGKILL'), patienceMs);
    const how = await ended;
    clearTimeout(limit);
    if (signal === 'SIGTERM' && how === 'SIGKILL') throw new Error(`the server would not end:\n${output}`);
  };
  return { url, output: () => output, ended, stop: () => endBy('SIGTERM'), kill: () => endBy('SIGKILL') };
}

/** Starts the built server on a free port of loopback and waits until it says that it is ready. */
export async function startServer(env: Record<string, string>): Promise<ServerProcess> {
  const port = await findFreePort();
  const url = `http://127.0.0.1:${port}`;
  const server = spawnServer({ PORT: `${port}`, APP_URL: url, ...env }, url);
  const seen: { end?: number | string } = {};
  void server.ended.then((how) => (seen.end = how));
  try {
    await vi.waitUntil(async () => seen.end !== undefined || (await isReady(url)), {
      timeout: patienceMs,
      interval: 100,
    });
    if (seen.end !== undefined) throw new Error(`it ended with ${seen.end}`);
    return server;
  } catch (error) {
    await server.kill();
    throw new Error(`The server did not come up:\n${server.output()}`, { cause: error });
  }
}

async function isReady(url: string): Promise<boolean> {
  try {
    return (await fetch(`${url}/api/ready`)).status === 200;
  } catch {
    return false; // nobody listens yet
  }
}
