import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import { addGroundwork, addLowestFloor, addStack, addUpperFloor } from './cutaway-floors';
import { plugFt, stackFt, type DrawnHouse } from './cutaway-house';
import { drainAt, pipe, type Runs } from './cutaway-run';

/** All drains, wastes and vents of a house, from its geometry. Groundwork, tested by a standpipe, ends above the slab. */
export function runsOf(house: DrawnHouse, method: DwvMethod | null, levelFt: number | null): Runs {
  const made: Runs = {
    runs: [pipe(4, plugFt, 0, stackFt, drainAt(stackFt))],
    sewer: pipe(4, -2.3, -0.094, plugFt, 0),
    openings: [],
    joints: [{ at: [stackFt, 0.4], nominalIn: 3 }],
  };
  const [lowest, ...upper] = house.floors;
  if (!lowest) return made;
  if (method === 'standpipe') {
    addGroundwork(made, lowest, levelFt);
    return made;
  }
  addStack(made, house, lowest);
  const riserTopFt = method === 'laundry-riser' && levelFt !== null ? levelFt + 0.4 : null;
  addLowestFloor(made, house, lowest, riserTopFt);
  upper.forEach((floor) => addUpperFloor(made, house, floor, riserTopFt));
  return made;
}
