import type { Pipe } from './house-fields.js';
import { gallonsPerFoot } from './pipes.js';
import { isAbove } from './tolerance.js';

/** US gallons that stand in the pipes when the water reaches `levelFt`. */
export const volumeBelowGal = (pipes: readonly Pipe[], levelFt: number): number =>
  pipes.reduce((sum, pipe) => sum + pipe.lengthFt * shareBelow(pipe, levelFt) * gallonsPerFoot(pipe.nominalIn), 0);

/** The share of a pipe's span at or below the level; a level pipe counts whole or not at all. */
function shareBelow({ bottomFt, topFt }: Pipe, levelFt: number): number {
  if (!isAbove(topFt, bottomFt)) return isAbove(bottomFt, levelFt) ? 0 : 1;
  return Math.min(1, Math.max(0, (levelFt - bottomFt) / (topFt - bottomFt)));
}
