import type { DwvLevel, PlugLoad } from './dwv-plan.contract.js';
import type { Floor, Plug } from './house-fields.js';
import { boreAreaSqIn } from './pipes.js';

/** What stands on a point at an elevation: feet of water (null under air) and psi. */
export type LoadAt = (elevationFt: number) => { headFt: number | null; pressurePsi: number };

interface Points {
  floors: readonly Floor[];
  highestFittingFt: number;
  lowestFittingFt: number;
  plugs: readonly Plug[];
}

/** The floors from the top down, then the highest fitting, the lowest fitting and each plug, with what stands on each. */
export function levelsOf(points: Points, loadAt: LoadAt): DwvLevel[] {
  return [
    ...floorsTopDown(points.floors),
    { name: 'highest fitting', elevationFt: points.highestFittingFt },
    { name: 'lowest fitting', elevationFt: points.lowestFittingFt },
    ...points.plugs,
  ].map(({ name, elevationFt }) => ({ name, elevationFt, ...loadAt(elevationFt) }));
}

export const floorsTopDown = (floors: readonly Floor[]): Floor[] =>
  [...floors].sort((a, b) => b.elevationFt - a.elevationFt);

/** Each plug's pressure, share of its rating, and thrust where its size is known (pressure × bore). */
export function plugLoadsOf(plugs: readonly Plug[], loadAt: LoadAt): PlugLoad[] {
  return plugs.map(({ name, elevationFt, ratedPsi, nominalIn }) => {
    const { headFt, pressurePsi } = loadAt(elevationFt);
    const forceLbf = nominalIn === null ? null : pressurePsi * boreAreaSqIn(nominalIn);
    return { name, elevationFt, headFt, pressurePsi, ratedPsi, loadFraction: pressurePsi / ratedPsi, forceLbf };
  });
}
