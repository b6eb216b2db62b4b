import type { Request } from 'express';
import { describe, expect, it } from 'vitest';
import { refuseOtherPages } from './own-page.js';

/** Headers as the Fetch standard has them: Sec-Fetch-Site is one of cross-site, same-origin, same-site, none. */
function requestOf(headers: Record<string, string>): Request {
  return { get: (name: string) => headers[name] } as unknown as Request;
}

const appUrl = 'https://holdwater.example.test';
const attempt = (headers: Record<string, string>) => () => refuseOtherPages(requestOf(headers), appUrl);

describe('a route that acts by the cookie', () => {
  it.each<Record<string, string>>([
    { 'sec-fetch-site': 'cross-site' },
    { 'sec-fetch-site': 'same-site', origin: 'https://other.example.test' },
    { 'sec-fetch-site': 'none' },
    { origin: 'https://other.example.test', host: 'holdwater.example.test' },
    { origin: 'null', host: 'holdwater.example.test' },
    { origin: 'http://holdwater.example.test:8080', host: 'holdwater.example.test' },
  ])('refuses %o', (headers) => {
    expect(attempt(headers)).toThrow('not-allowed');
  });

  it.each<Record<string, string>>([
    { 'sec-fetch-site': 'same-origin', origin: 'http://localhost:5173' },
    { origin: appUrl, host: '10.0.0.4:4310' },
    { origin: 'http://localhost:4310', host: 'localhost:4310' },
    {},
  ])('answers %o', (headers) => {
    expect(attempt(headers)).not.toThrow();
  });
});
