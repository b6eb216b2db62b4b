import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

/** What a chain begins with. */
export const genesisHash = '0'.repeat(64);

export interface HashedEntry {
  scope: string;
  sequence: number;
  at: string;
  kind: string;
  actorId: string | null;
  actorRole: string | null;
  payload: Record<string, unknown>;
  previousHash: string;
}

/** SHA-256 over the canonical JSON (RFC 8785) of an entry, the hash before it included. */
export function hashOf(entry: HashedEntry): string {
  return createHash('sha256')
    .update(canonicalize(entry) ?? '')
    .digest('hex');
}
