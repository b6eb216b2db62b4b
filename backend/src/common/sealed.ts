import { createCipheriv, createDecipheriv, createHash, randomBytes } from 'node:crypto';

/** Seals a secret that must wait in the database for its mail (AES-256-GCM under a key derived from the server's secret). */
export function seal(plain: string, secret: string): string {
  const iv = randomBytes(12);
  const cipher = createCipheriv('aes-256-gcm', keyOf(secret), iv);
  const sealed = Buffer.concat([cipher.update(plain, 'utf8'), cipher.final()]);
  return Buffer.concat([iv, cipher.getAuthTag(), sealed]).toString('base64url');
}

/** Opens what `seal` closed. Throws when it was altered or sealed under another secret. */
export function unseal(sealed: string, secret: string): string {
  const bytes = Buffer.from(sealed, 'base64url');
  const decipher = createDecipheriv('aes-256-gcm', keyOf(secret), bytes.subarray(0, 12));
  decipher.setAuthTag(bytes.subarray(12, 28));
  return Buffer.concat([decipher.update(bytes.subarray(28)), decipher.final()]).toString('utf8');
}

function keyOf(secret: string): Buffer {
  return createHash('sha256').update(`holdwater seal ${secret}`).digest();
}
