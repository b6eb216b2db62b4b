import { AsyncLocalStorage } from 'node:async_hooks';
import type { Actor } from '../access/actor.js';

/** What belongs to the request being served, wherever in the code one is. */
export interface RequestContext {
  requestId: string;
  actor: Actor | null;
  /** Server clock less client clock, in milliseconds, from the `X-Sent-At` header. */
  clockOffsetMs: number;
  /** Present where the request carries an `Idempotency-Key`. */
  idempotency: { route: string; key: string; bodyHash: string } | null;
}

export const requestContext = new AsyncLocalStorage<RequestContext>();

export function currentRequest(): RequestContext | null {
  return requestContext.getStore() ?? null;
}
