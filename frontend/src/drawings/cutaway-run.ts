import { plugFt } from './cutaway-house';
import type { Feet } from './cutaway-scale';

/** A stretch of drain, waste or vent as drawn. `trap` bends from its last point down and round to a riser. */
export interface Run {
  points: readonly Feet[];
  nominalIn: number;
  trap?: { riserFt: number; topFt: number };
}

/** An end that a test needs closed when water stands above it. */
export interface Opening {
  at: Feet;
  nominalIn: number;
  isSideways?: boolean;
}

export interface Runs {
  runs: Run[];
  /** Beyond the plug: never under test. */
  sewer: Run;
  openings: Opening[];
  /** Where joints are primed. */
  joints: { at: Feet; nominalIn: number }[];
}

/** Every drain falls a quarter inch per foot toward the stack and the plug. */
export const fallPerFt = 0.25 / 12;

/** Height of the building drain over the plug. */
export function drainAt(x: number): number {
  return Math.abs(x - plugFt) * fallPerFt;
}

/** A pipe through points: x and height in turns, feet. */
export function pipe(nominalIn: number, ...coordinates: number[]): Run {
  const points = Array.from({ length: coordinates.length / 2 }, (_, index): Feet => {
    return [coordinates[2 * index] ?? 0, coordinates[2 * index + 1] ?? 0];
  });
  return { points, nominalIn };
}
