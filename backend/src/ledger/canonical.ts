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

export interface AnchorFacts {
  day: string;
  at: string;
  chains: number;
  previousHash: string;
}

/**
 * SHA-256 over the canonical JSON of an anchor and then of each head it names, one a line, in the order given: by scope, so that anybody can
 * compute it again without holding all of them at once.
 */
export function anchorHashOf(
  facts: AnchorFacts,
  heads: ReadonlyArray<{ scope: string; sequence: number; hash: string }>,
): string {
  const digest = createHash('sha256').update(canonicalize(facts) ?? '');
  for (const { scope, sequence, hash } of heads) digest.update(`\n${canonicalize({ scope, sequence, hash }) ?? ''}`);
  return digest.digest('hex');
}
