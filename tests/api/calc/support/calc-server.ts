import { createWorld } from '@holdwater/backend/testing/fixtures/world.js';
import { startTestApp, type TestApp } from '@holdwater/backend/testing/test-app.js';
import { afterAll, beforeAll } from 'vitest';

export interface CalcAnswer {
  status: number;
  // of any shape until a test looks at it
  body: Record<string, unknown> & { fields?: Record<string, string> };
}

export interface CalcServer {
  /** Posts to `/api/calc/<route>` as a signed-in person, without an idempotency key. A string goes out as the JSON it is. */
  ask(route: string, given: object | string): Promise<CalcAnswer>;
  /** The body of the answer, which must be 200. */
  answer(route: string, given: object): Promise<CalcAnswer['body']>;
}

/** One server and one signed-in person for the tests of a file. */
export function useCalcServer(): CalcServer {
  let server: TestApp;
  let token: string;
  beforeAll(async () => {
    server = await startTestApp();
    const world = await createWorld(server);
    token = world.tokenOf('helper');
  });
  afterAll(() => server?.close());

  const ask = async (route: string, given: object | string): Promise<CalcAnswer> => {
    const response = await fetch(`${server.url}/api/calc/${route}`, {
      method: 'POST',
      headers: { Authorization: `Bearer ${token}`, 'Content-Type': 'application/json' },
      body: typeof given === 'string' ? given : JSON.stringify(given),
    });
    return { status: response.status, body: (await response.json()) as CalcAnswer['body'] };
  };
  const answer = async (route: string, given: object) => {
    const { status, body } = await ask(route, given);
    if (status !== 200) throw new Error(`${route} answered ${status}: ${JSON.stringify(body)}`);
    return body;
  };
  return { ask, answer };
}
