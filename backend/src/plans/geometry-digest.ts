import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import { houseGeometry, type HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';

/**
 * What a house is told apart by: SHA-256 over its canonical JSON (RFC 8785), so that neither the order of keys nor a default written out or
 * left out makes it another house.
 */
export function geometryDigest(geometry: HouseGeometry): string {
  const parsed = houseGeometry.safeParse(geometry);
  return createHash('sha256')
    .update(canonicalize(parsed.success ? parsed.data : geometry) ?? '')
    .digest('hex');
}
