import { createHash, randomUUID } from 'node:crypto';
import type { NextFunction, Request, Response } from 'express';
import { requestContext } from './request-context.js';

const keyPattern = /^[A-Za-z0-9_-]{8,100}$/;

/** Opens the context of a request: its id, the client's clock, the idempotency key. */
export function openRequestContext(request: Request & { id?: string }, _response: Response, next: NextFunction): void {
  const requestId = request.id ?? randomUUID();
  requestContext.run(
    { requestId, actor: null, clockOffsetMs: offsetOf(request), idempotency: idempotencyOf(request) },
    next,
  );
}

function offsetOf(request: Request): number {
  const sentAt = Date.parse(request.get('x-sent-at') ?? '');
  return Number.isNaN(sentAt) ? 0 : Date.now() - sentAt;
}

function idempotencyOf(request: Request) {
  const key = request.get('idempotency-key');
  if (key === undefined || !keyPattern.test(key) || request.method === 'GET') return null;
  const bodyHash = createHash('sha256')
    .update(JSON.stringify(request.body ?? null))
    .digest('hex');
  return { route: `${request.method} ${request.path}`, key, bodyHash };
}
