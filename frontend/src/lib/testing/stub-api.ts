import type { ErrorCode } from '@holdwater/shared-types/errors/catalogue.js';
import { errorCatalogue } from '@holdwater/shared-types/errors/catalogue.js';
import { AxiosError, AxiosHeaders, type AxiosResponse, type InternalAxiosRequestConfig } from 'axios';
import { afterEach } from 'vitest';
import { http } from '../http';

/** One request as it left the page. */
export interface SentRequest {
  readonly method: string;
  readonly path: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly query: Readonly<Record<string, unknown>>;
  readonly body: unknown;
}

export interface StubAnswer {
  readonly status?: number;
  readonly data: unknown;
}

type Handler = (request: SentRequest) => StubAnswer | Promise<StubAnswer>;

/** An error body of the catalogue. */
export function refusal(code: ErrorCode, more: { params?: object; fields?: object; entry?: string } = {}): StubAnswer {
  return { status: errorCatalogue[code], data: { code, message: code, ...more } };
}

const wasAdapter = http.defaults.adapter;
afterEach(() => {
  http.defaults.adapter = wasAdapter;
});

/**
 * Answers the page's calls in place of a server, `{ 'GET /api/me': () => ({ data }) }`; keeps what was sent. A call nobody answers fails the
 * spec: it is answered 599 and thrown at.
 */
export function stubApi(handlers: Record<string, Handler>): SentRequest[] {
  const sent: SentRequest[] = [];
  http.defaults.adapter = async (config) => {
    const request = requestOf(config);
    sent.push(request);
    const handler = handlers[`${request.method} ${request.path}`];
    if (handler === undefined) throw new Error(`nobody answers ${request.method} ${request.path}`);
    const answer = await handler(request);
    return settle(config, answer);
  };
  return sent;
}

/** Fails as the browser does without a network, or when the time is over. */
export function noAnswer(code: 'ERR_NETWORK' | 'ECONNABORTED'): never {
  throw new AxiosError('no answer', code);
}

function requestOf(config: InternalAxiosRequestConfig): SentRequest {
  const query = Object.entries((config.params ?? {}) as Record<string, unknown>).filter(
    ([, value]) => value !== undefined,
  );
  return {
    method: (config.method ?? 'get').toUpperCase(),
    path: config.url ?? '',
    headers: config.headers.toJSON() as Record<string, string>,
    query: Object.fromEntries(query),
    body: typeof config.data === 'string' ? (JSON.parse(config.data) as unknown) : config.data,
  };
}

function settle(config: InternalAxiosRequestConfig, { status = 200, data }: StubAnswer): AxiosResponse {
  const response: AxiosResponse = { status, statusText: '', data, headers: new AxiosHeaders(), config };
  if (status < 400) return response;
  throw new AxiosError(`status ${status}`, 'ERR_BAD_RESPONSE', config, null, response);
}
