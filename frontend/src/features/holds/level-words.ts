import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { TFunction } from 'i18next';

/** How high water stands over the lowest test plug, in feet; null where no plug is measured. */
export function feetAbovePlug(levelFt: number, house: Pick<HouseGeometry, 'plugs'> | null): number | null {
  const plugs = house?.plugs.map(({ elevationFt }) => elevationFt) ?? [];
  return plugs.length === 0 ? null : levelFt - Math.min(...plugs);
}

/** "24.0 ft above the plug"; without a measured plug above the first floor. `t` of the namespace `holds`. */
export function levelWords(t: TFunction<'holds'>, levelFt: number, house: Pick<HouseGeometry, 'plugs'> | null): string {
  const abovePlug = feetAbovePlug(levelFt, house);
  if (abovePlug !== null) return t('level.abovePlug', { feet: abovePlug.toFixed(1) });
  return t('level.aboveFloor', { feet: levelFt.toFixed(1) });
}
