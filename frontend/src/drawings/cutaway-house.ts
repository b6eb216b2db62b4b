import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';

/** What the section is drawn from; elevations in feet above the finished first floor. */
export type CutawayHouse = Pick<
  HouseGeometry,
  'floors' | 'lowestFittingFt' | 'ventTerminalFt' | 'atticCutFt' | 'standpipeFt' | 'laundry' | 'plugs'
> & { gaugeFt?: number | null };

/** Feet from the left wall; the house is drawn this wide. */
export const houseWidthFt = 30;
export const stackFt = 21;
/** The test plug in the building drain. */
export const plugFt = 2.2;

export interface DrawnFloor {
  name: string;
  /** Feet above the lowest test plug. */
  heightFt: number;
  hasLaundry: boolean;
}

/** A house as drawn: every height in feet above the lowest test plug. */
export interface DrawnHouse {
  /** The plug's elevation above the first floor: what is taken off every elevation. */
  datumFt: number;
  /** From the lowest up. */
  floors: DrawnFloor[];
  atticFt: number;
  ventFt: number;
  cutFt: number | null;
  /** The line in the attic where the vents join the stack. */
  headerFt: number;
  eaveFt: number;
  /** Rise of the roof per foot. */
  slope: number;
  ridgeFt: number;
  laundryOutletFt: number | null;
}

const usualFloorHeightFt = 9;

function datumOf(house: CutawayHouse, lowestFloorFt: number): number {
  const plugs = house.plugs.map((plug) => plug.elevationFt);
  if (plugs.length > 0) return Math.min(...plugs);
  return house.lowestFittingFt ?? lowestFloorFt - 3;
}

/** Works out the drawing's heights; what the geometry does not say yet (attic, roof) is drawn as houses usually are. */
export function drawHouse(house: CutawayHouse): DrawnHouse {
  const given = house.floors.length > 0 ? house.floors : [{ name: 'first', elevationFt: 0 }];
  const sorted = [...given].sort((a, b) => a.elevationFt - b.elevationFt);
  const datumFt = datumOf(house, sorted[0]?.elevationFt ?? 0);
  const floors = sorted.map((floor) => ({
    name: floor.name,
    heightFt: floor.elevationFt - datumFt,
    hasLaundry: house.laundry?.floor === floor.name,
  }));
  const topFt = floors.at(-1)?.heightFt ?? 0;
  const usualAtticFt = topFt + usualFloorHeightFt;
  const ventFt = house.ventTerminalFt === null ? usualAtticFt + 5.5 : house.ventTerminalFt - datumFt;
  const cutFt = house.atticCutFt === null ? null : house.atticCutFt - datumFt;
  const atticFt = Math.max(topFt + 6, Math.min(usualAtticFt, ventFt - 3.2, cutFt === null ? Infinity : cutFt - 1));
  const eaveFt = atticFt + 0.4;
  const slope = Math.min(10 / 12, Math.max(2 / 12, (ventFt - 1.35 - eaveFt) / (houseWidthFt - stackFt)));
  return {
    datumFt,
    floors,
    atticFt,
    ventFt,
    cutFt,
    headerFt: Math.min(atticFt + 1, ventFt - 1.6, cutFt === null ? Infinity : cutFt - 0.6),
    eaveFt,
    slope,
    ridgeFt: eaveFt + (houseWidthFt / 2) * slope,
    laundryOutletFt: laundryOutlet(house, datumFt, floors),
  };
}

function laundryOutlet(house: CutawayHouse, datumFt: number, floors: readonly DrawnFloor[]): number | null {
  const floor = floors.find((one) => one.hasLaundry);
  if (!floor) return null;
  const outlet = house.laundry?.boxOutletFt ?? null;
  return outlet === null ? floor.heightFt + 3.5 : outlet - datumFt;
}
