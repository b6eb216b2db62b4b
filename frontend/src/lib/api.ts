import type { RouteAnswer, RouteCall, RouteContract } from '@holdwater/shared-types/common/route.js';
import { refreshSession } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { AxiosRequestConfig } from 'axios';
import { getAccessToken } from './access-token';
import { isApiError } from './api-error';
import { http, toApiError } from './http';
import { refreshAccess } from './session-refresh';

export interface CallOptions {
  readonly signal?: AbortSignal;
  /** One per intent; `useIdempotentMutation` keeps it over retries. A write without one gets a key of its own. */
  readonly idempotencyKey?: string;
}

type Rest<R> =
  Record<never, never> extends RouteCall<R>
    ? [input?: RouteCall<R>, options?: CallOptions]
    : [input: RouteCall<R>, options?: CallOptions];

interface LooseInput {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
}

/**
 * Calls a route by its contract. Reads carry the access token; writes also the clock of this device and an idempotency key. A token that ran
 * out is renewed once and the call repeated with the same key.
 * @throws ApiError with the code of the error catalogue, or `offline`, `slow`, `unknown`
 */
export async function call<R extends RouteContract>(
  contract: R,
  ...[input, options]: Rest<R>
): Promise<RouteAnswer<R>> {
  const request = requestOf(contract, input ?? {}, options ?? {});
  const data = await sendRenewing(contract, request);
  // A fault of ours shows where it is made; a released page does not pay for it.
  return (import.meta.env.DEV ? contract.answer.parse(data) : data) as RouteAnswer<R>;
}

function requestOf(contract: RouteContract, input: LooseInput, options: CallOptions): AxiosRequestConfig {
  const isWrite = contract.method !== 'GET';
  return {
    method: contract.method,
    url: pathOf(contract.path, input.params ?? {}),
    params: input.query,
    data: input.body,
    signal: options.signal,
    headers: isWrite ? { 'Idempotency-Key': options.idempotencyKey ?? crypto.randomUUID() } : {},
  };
}

/** Fills `:name` parts of a contract's path. */
export function pathOf(path: string, params: Record<string, unknown>): string {
  return path.replace(/:([A-Za-z]+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined || value === null) throw new Error(`${path} needs ${name}`);
    return encodeURIComponent(typeof value === 'string' ? value : JSON.stringify(value));
  });
}

async function sendRenewing(contract: RouteContract, request: AxiosRequestConfig): Promise<unknown> {
  const sentWith = getAccessToken();
  try {
    return await send(request);
  } catch (error) {
    if (!isApiError(error, 'signed-out') || contract.path === refreshSession.path || sentWith === null) throw error;
    // Somebody else may have renewed it while this call was under way.
    if (getAccessToken() === sentWith) await refreshAccess();
    return send(request);
  }
}

async function send(request: AxiosRequestConfig): Promise<unknown> {
  const token = getAccessToken();
  const headers: Record<string, string> = { ...(request.headers as Record<string, string>) };
  if (token !== null) headers['Authorization'] = `Bearer ${token}`;
  if (request.method !== 'GET') headers['X-Sent-At'] = new Date().toISOString();
  try {
    return (await http.request<unknown>({ ...request, headers })).data;
  } catch (error) {
    throw toApiError(error);
  }
}
