import type { DrawnHouse } from './cutaway-house';

/** Pressure of a foot of water where no plan answered yet (interface guide: 0.433 psi per ft). */
export const psiPerFt = 0.433;

/** What a plan says stands at a point; elevation in feet above the finished first floor. */
export interface PlanLevel {
  name: string;
  elevationFt: number;
  headFt: number | null;
  pressurePsi: number;
}

/** One row of the chain of heads and of its text twin. */
export interface HeadRow {
  key: string;
  kind: 'attic' | 'floor' | 'plug';
  name: string;
  /** Above the lowest test plug. */
  heightFt: number;
  /** Feet of water; null under air. */
  headFt: number | null;
  pressurePsi: number;
}

/**
 * Heads from the top down: attic, floors, the lowest plug. The plan's answer where there is one; else the level less the
 * height, at 0.433 psi per foot. Empty without a level and without a plan.
 */
export function headRows(
  house: DrawnHouse,
  levelFt: number | null,
  levels: readonly PlanLevel[],
  plugName: string | null,
): HeadRow[] {
  if (levelFt === null && levels.length === 0) return [];
  const row = (kind: HeadRow['kind'], name: string, heightFt: number): HeadRow => {
    const planned = levels.find(
      (level) => level.name === name && Math.abs(level.elevationFt - house.datumFt - heightFt) < 0.01,
    );
    const headFt = levelFt === null ? null : Math.max(0, levelFt - heightFt);
    return {
      key: `${kind}-${name}`,
      kind,
      name,
      heightFt,
      headFt: planned ? planned.headFt : headFt,
      pressurePsi: planned ? planned.pressurePsi : (headFt ?? 0) * psiPerFt,
    };
  };
  const attic = levelFt !== null && levelFt > house.atticFt ? [row('attic', 'attic', house.atticFt)] : [];
  const floors = [...house.floors].reverse().map((floor) => row('floor', floor.name, floor.heightFt));
  return [...attic, ...floors, row('plug', plugName ?? 'plug', 0)];
}
