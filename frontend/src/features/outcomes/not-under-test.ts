import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';

/** What the water of a drain test does not reach. */
export interface NotUnderTest {
  /** Feet above the finished first floor. */
  readonly fromFt: number;
  readonly toFt: number;
  readonly floors: readonly string[];
}

/** The part of the vents above the level, and the floors over it; null where the method leaves nothing dry or nobody measured it. */
export function notUnderTest(
  hold: Pick<Hold, 'method' | 'fillLevelFt'> | null,
  house: Pick<HouseGeometry, 'ventTerminalFt' | 'floors'> | null,
): NotUnderTest | null {
  const fromFt = hold?.fillLevelFt ?? null;
  const toFt = house?.ventTerminalFt ?? null;
  if (hold === null || house === null || fromFt === null || toFt === null || hold.method === 'sectional') return null;
  // finer than a tenth of a foot is not told
  if (toFt - fromFt < 0.05) return null;
  const floors = house.floors.filter(({ elevationFt }) => elevationFt > fromFt).map(({ name }) => name);
  return { fromFt, toFt, floors };
}
