import type { ServerResponse } from 'node:http';

/** A refusal as the API tells it. */
export class HttpError extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
  ) {
    super(message);
  }
}

/** Nothing from outside, no script but the page's own; mails may style themselves. */
const contentSecurityPolicy = [
  "default-src 'none'",
  "style-src 'self' 'unsafe-inline'",
  "script-src 'self'",
  "connect-src 'self'",
  "font-src 'self'",
  'img-src data:',
  "form-action 'none'",
  "base-uri 'none'",
  "frame-ancestors 'none'",
].join('; ');

export function answer(response: ServerResponse, status: number, contentType: string, body: string | Buffer): void {
  response.writeHead(status, {
    'content-type': contentType,
    'content-length': Buffer.byteLength(body),
    'cache-control': 'no-store',
    'content-security-policy': contentSecurityPolicy,
    'referrer-policy': 'no-referrer',
    'x-content-type-options': 'nosniff',
    'x-dns-prefetch-control': 'off',
  });
  response.end(body);
}

export function answerJson(response: ServerResponse, status: number, value: unknown): void {
  answer(response, status, 'application/json; charset=utf-8', JSON.stringify(value));
}
