import { randomUUID } from 'node:crypto';
import type { RouteAnswer, RouteCall, RouteContract } from '@holdwater/shared-types/common/route.js';

/** The demo is made as people make it: through the server's own routes. */
export class DemoClient {
  constructor(
    private readonly url: string,
    private readonly tokenOf: (personKey: string) => Promise<string>,
  ) {}

  /** Calls a route as a demo person; throws with the server's words when it refuses. */
  async call<const R extends RouteContract>(
    contract: R,
    personKey: string,
    input: RouteCall<R>,
  ): Promise<RouteAnswer<R>> {
    const parts = input as { params?: Record<string, string>; query?: Record<string, string>; body?: unknown };
    const path = contract.path.replaceAll(/:(\w+)/g, (_whole, name: string) =>
      encodeURIComponent(String(parts.params?.[name])),
    );
    const query = parts.query ? `?${new URLSearchParams(parts.query).toString()}` : '';
    const answer = await fetch(`${this.url}${path}${query}`, {
      method: contract.method,
      headers: {
        authorization: `Bearer ${await this.tokenOf(personKey)}`,
        'content-type': 'application/json',
        'idempotency-key': randomUUID(),
      },
      ...(contract.method !== 'GET' && { body: JSON.stringify(parts.body ?? {}) }),
    });
    const body: unknown = await answer.json();
    if (!answer.ok) throw new Error(`${personKey}: ${contract.method} ${path} was refused: ${JSON.stringify(body)}`);
    return body as RouteAnswer<R>;
  }
}
