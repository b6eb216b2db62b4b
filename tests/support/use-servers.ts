import { afterAll, afterEach, vi } from 'vitest';
import { patienceMs, startServer, type ServerProcess } from './server-process.js';

/** How much of a server's log is shown when a test failed. */
const shownLines = 60;

export interface Servers {
  start(env: Record<string, string>): Promise<ServerProcess>;
}

/** The servers of one describe: whatever happens they end with it, and their logs are shown when a test fails. */
export function useServers(): Servers {
  const started: ServerProcess[] = [];
  // a test may start or end several processes
  vi.setConfig({ testTimeout: 3 * patienceMs, hookTimeout: 3 * patienceMs });
  afterEach(({ task }) => {
    if (task.result?.state !== 'fail') return;
    for (const { url, output } of started) console.error(`${url} wrote last:\n${lastLines(output())}`);
  });
  afterAll(async () => {
    const ends = await Promise.allSettled(started.map((server) => server.stop()));
    const failed = ends.find((end) => end.status === 'rejected');
    if (failed) throw failed.reason;
  });
  return {
    start: async (env) => {
      const server = await startServer(env);
      started.push(server);
      return server;
    },
  };
}

function lastLines(text: string): string {
  return text.trimEnd().split('\n').slice(-shownLines).join('\n');
}
