import { execFileSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { hashOfSecret, newSecret, successorOf } from './secrets.js';

describe('secrets', () => {
  // OWASP ASVS 5.0, 7.2.3: reference tokens of 128 bits or more; ours have 256
  it('are 256 bits and never twice the same', () => {
    const made = Array.from({ length: 100 }, newSecret);
    expect(new Set(made).size).toBe(100);
    for (const secret of made) expect(Buffer.from(secret, 'base64url')).toHaveLength(32);
  });

  // FIPS 180-2, appendix B.1: SHA-256 of "abc"
  it('are kept as their SHA-256', () => {
    expect(hashOfSecret('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });

  // reckoned again by OpenSSL's own command
  it('have one successor, by HMAC-SHA-256 under the server secret', () => {
    const expected = execFileSync('openssl', ['dgst', '-sha256', '-hmac', 'holdwater refresh s', '-binary'], {
      input: 'a token',
    });
    expect(successorOf('a token', 's')).toBe(expected.toString('base64url'));
    expect(successorOf('a token', 'another')).not.toBe(successorOf('a token', 's'));
  });
});
