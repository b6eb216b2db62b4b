/**
 * `npm run serve`: the built server in production. Everything comes from the environment; nothing is installed or started
 * besides, and what is missing in the environment the server itself lists.
 */
import path from 'node:path';
import { ensureBuilt, isBuilt } from './lib/build.mjs';
import { runCommandLine } from './lib/lifetime.mjs';
import { checkPlatform } from './lib/node-version.mjs';
import { prepareDataFolders, root } from './lib/paths.mjs';
import { signalProcess, waitUntilGone } from './lib/process-identity.mjs';
import { spawnBound } from './lib/spawning.mjs';

const stopLimitMs = 30_000;

async function serve(lifetime) {
  checkPlatform();
  const missing = ['server', 'page'].filter((part) => !isBuilt(part));
  if (missing.length > 0) {
    prepareDataFolders();
    await ensureBuilt(missing);
  }
  const env = {
    STATIC_DIR: path.join(root, 'frontend/dist'),
    ...process.env,
    NODE_ENV: 'production',
    HOLDWATER_MODE: 'production',
    TZ: 'UTC',
  };
  const args = [path.join(root, 'backend/dist/main.js')];
  const server = spawnBound(process.execPath, args, {
    env,
    cwd: root,
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  let hasEnded = false;
  lifetime.onEnd(async () => {
    if (hasEnded) return;
    signalProcess(server.pid, 'SIGTERM');
    if (!(await waitUntilGone(() => hasEnded, stopLimitMs))) signalProcess(-server.pid, 'SIGKILL');
  });
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.once('exit', (code) => {
      hasEnded = true;
      resolve(code ?? 1);
    });
  });
}

runCommandLine(serve, { exitCodeWhenStopped: 0 });
