import { createHash, randomUUID } from 'node:crypto';
import type { NextFunction, Request, Response } from 'express';
import { refuse } from '../errors/app-error.js';
import { requestContext } from './request-context.js';

const keyPattern = /^[A-Za-z0-9_-]{8,100}$/;
/** No phone's clock is off by more: a battery that ran out sets it back to 1970. */
const mostOffsetMs = 100 * 366 * 86_400_000;

/** Opens the context of a request: its id, the client's clock, the idempotency key. Throws `bad-input` for a key that is none. */
export function openRequestContext(request: Request & { id?: string }, _response: Response, next: NextFunction): void {
  const requestId = request.id ?? randomUUID();
  requestContext.run(
    { requestId, actor: null, clockOffsetMs: offsetOf(request), idempotency: idempotencyOf(request) },
    next,
  );
}

function offsetOf(request: Request): number {
  const offset = Date.now() - Date.parse(request.get('x-sent-at') ?? '');
  return Math.abs(offset) <= mostOffsetMs ? offset : 0;
}

function idempotencyOf(request: Request) {
  const key = request.get('idempotency-key');
  if (key === undefined || request.method === 'GET' || request.method === 'HEAD') return null;
  // to take it for no key would let the repeat through that it was sent against
  if (!keyPattern.test(key)) return refuse('bad-input', {}, { 'Idempotency-Key': 'not-a-code' });
  return { route: `${request.method} ${request.path}`, key, bodyHash: hashOf(request.body) };
}

function hashOf(body: unknown): string {
  return createHash('sha256').update(textOf(body)).digest('hex');
}

function textOf(body: unknown): string {
  try {
    return JSON.stringify(body ?? null);
  } catch (error) {
    // nested deeper than the stack: no contract of ours
    if (error instanceof RangeError) return refuse('bad-input');
    throw error;
  }
}
