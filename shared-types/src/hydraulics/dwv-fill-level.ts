import type { DwvMethod } from '../holds/hold.states.js';
import type { Floor, Laundry } from './house-fields.js';
import { isAbove } from './tolerance.js';

/** What the level of a method is worked out from. */
export interface FillSource {
  method: DwvMethod;
  ventTerminalFt: number | null;
  atticCutFt: number | null;
  standpipeFt: number | null;
  laundry: Laundry | null;
  riserIn: number;
}

/** Where the method fills to, feet above the first floor; null for air, and where a field it needs is absent. */
export function ownFillLevelFt(source: FillSource): number | null {
  switch (source.method) {
    case 'stack-to-roof':
    case 'sectional':
      return source.ventTerminalFt;
    case 'attic-cut':
      return source.atticCutFt;
    case 'laundry-box':
      return source.laundry?.boxOutletFt ?? null;
    case 'laundry-riser': {
      const branchFt = source.laundry?.branchFt ?? null;
      return branchFt === null ? null : branchFt + source.riserIn / 12;
    }
    case 'standpipe':
      return source.standpipeFt;
    case 'air':
      return null;
  }
}

const paths: Readonly<Record<DwvMethod, readonly string[]>> = {
  'stack-to-roof': ['ventTerminalFt'],
  sectional: ['ventTerminalFt'],
  'attic-cut': ['atticCutFt'],
  'laundry-box': ['laundry', 'boxOutletFt'],
  'laundry-riser': ['laundry', 'branchFt'],
  standpipe: ['standpipeFt'],
  air: ['airPsi'],
};

/** The field that a method's level hangs on. */
export const fillPath = (method: DwvMethod): readonly string[] => paths[method];

/** Does the laundry stand on the lowest floor? A floor that is not listed counts as not the lowest. */
export function isLaundryOnLowestFloor(laundry: Laundry, floors: readonly Floor[]): boolean {
  const own = floors.find(({ name }) => name === laundry.floor);
  return own !== undefined && !isAbove(own.elevationFt, Math.min(...floors.map(({ elevationFt }) => elevationFt)));
}
