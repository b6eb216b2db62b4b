import type { HouseGeometry } from '../hydraulics/house-geometry.js';
import type { Pipe } from '../hydraulics/house-fields.js';

/**
 * The part of a house that is there before its slab is poured: the lowest floor's stubs, the pipes under them and the plugs down there.
 * Nothing above the slab stands yet, so no floor above it is under test or missing from it. Feet above the finished first floor.
 */
export function groundworkHouse(house: HouseGeometry): HouseGeometry {
  const lowest = [...house.floors].sort((a, b) => a.elevationFt - b.elevationFt)[0];
  const slabFt = lowest?.elevationFt ?? 0;
  return {
    ...house,
    floors: lowest === undefined ? [] : [lowest],
    highestFittingFt: Math.max(slabFt, house.lowestFittingFt ?? slabFt),
    cappedVents: 0,
    atticCutFt: null,
    laundry: null,
    plugs: house.plugs.filter(({ elevationFt }) => elevationFt <= slabFt),
    pipes: house.pipes.flatMap((pipe) => belowSlab(pipe, slabFt)),
  };
}

/** The share of a pipe's length that lies under the slab; a pipe wholly above it is not there yet. */
function belowSlab(pipe: Pipe, slabFt: number): Pipe[] {
  if (pipe.topFt <= slabFt) return [pipe];
  if (pipe.bottomFt >= slabFt) return [];
  const share = (slabFt - pipe.bottomFt) / (pipe.topFt - pipe.bottomFt);
  return [{ ...pipe, topFt: slabFt, lengthFt: pipe.lengthFt * share }];
}

/**
 * Where the open end of a standpipe would have to be for the rule: as high as it asks, or as high as the pipe itself. Before the house
 * stands there is no vent terminal that could be lower.
 */
export function standpipeEndFt(house: HouseGeometry, feetAboveHighest: number): number | null {
  if (house.standpipeFt === null || house.highestFittingFt === null) return house.standpipeFt;
  return Math.max(house.standpipeFt, house.highestFittingFt + feetAboveHighest);
}
