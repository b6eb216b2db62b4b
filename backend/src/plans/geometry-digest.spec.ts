import { describe, expect, it } from 'vitest';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { house } from '../testing/fixtures/house.js';
import { geometryDigest } from './geometry-digest.js';

describe('what a house is told apart by', () => {
  it('does not depend on the order its keys come back in from the database', () => {
    const given = house();
    const turned = Object.fromEntries(Object.entries(given).reverse()) as HouseGeometry;
    expect(geometryDigest(turned)).toBe(geometryDigest(given));
  });

  it('does not depend on a default being written out', () => {
    const { cappedVents: _left, ...bare } = house({ cappedVents: 0 });
    expect(geometryDigest(bare as HouseGeometry)).toBe(geometryDigest(house({ cappedVents: 0 })));
  });

  it('changes with any measure, and with the order of the floors’ plugs', () => {
    const changed = [house({ ventTerminalFt: 24.1 }), house({ plugs: [] }), house({ lowestRatedPsi: 161 })];
    const digests = [house(), ...changed].map(geometryDigest);
    expect(new Set(digests).size).toBe(4);
  });
});
