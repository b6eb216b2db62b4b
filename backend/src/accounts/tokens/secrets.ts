import { createHash, createHmac, randomBytes } from 'node:crypto';

/** A secret nobody guesses: 256 bits, fit for an address or a cookie. */
export function newSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** How a secret is kept: its SHA-256. A secret of 256 random bits needs no slow hash. */
export function hashOfSecret(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}

/**
 * The refresh token that replaces `token`: always the same one, and nobody without the server's secret can tell it. So a second tab, or a
 * repeat after a lost answer, is given what the first one got, though only hashes are kept.
 */
export function successorOf(token: string, serverSecret: string): string {
  return createHmac('sha256', `holdwater refresh ${serverSecret}`).update(token).digest('base64url');
}
