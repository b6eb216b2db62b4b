import { createServer } from 'node:http';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { ScenarioError } from './control.js';
import { answerJson, HttpError } from './http-answers.js';
import { route } from './http-routes.js';
import type { Surroundings } from './http-routes.js';
import { FilterError } from './message-filter.js';

export interface RunningHttpServer {
  port: number;
  stop(): Promise<void>;
}

/** Serves the API and the page on loopback. */
export async function startHttpServer(port: number, around: Omit<Surroundings, 'httpUrl'>): Promise<RunningHttpServer> {
  const server = createServer((request, response) => {
    const httpUrl = `http://127.0.0.1:${(server.address() as AddressInfo | null)?.port ?? port}`;
    void respond({ ...around, httpUrl }, request, response);
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  return {
    port: (server.address() as AddressInfo).port,
    stop: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

async function respond(around: Surroundings, request: IncomingMessage, response: ServerResponse): Promise<void> {
  try {
    assertLocalHost(request.headers.host);
    await route(new URL(request.url ?? '/', around.httpUrl), around, request, response);
  } catch (error) {
    const { status, code, message } = toHttpError(error);
    if (response.headersSent) response.destroy();
    else answerJson(response, status, { code, message });
  }
}

/** A name of somebody else's that points at this machine must not read the mails (DNS rebinding). */
function assertLocalHost(host = ''): void {
  if (!/^(127\.0\.0\.1|localhost|\[::1\])(:\d+)?$/i.test(host)) {
    throw new HttpError(403, 'wrong-host', 'Open the mailbox by 127.0.0.1 or localhost.');
  }
}

function toHttpError(error: unknown): HttpError {
  if (error instanceof HttpError) return error;
  if (error instanceof FilterError) return new HttpError(400, 'wrong-filter', error.message);
  if (error instanceof ScenarioError) return new HttpError(400, 'wrong-scenario', error.message);
  console.error('The mailbox could not answer a request:', error);
  return new HttpError(500, 'internal', 'The mailbox could not answer. What happened is in its log.');
}
