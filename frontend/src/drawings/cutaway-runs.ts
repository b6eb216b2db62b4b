import type { DwvMethod } from '@holdwater/shared-types/holds/hold.states.js';
import { plugFt, stackFt, type DrawnFloor, type DrawnHouse } from './cutaway-house';
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
const fallPerFt = 0.25 / 12;

/** Height of the building drain over the plug. */
export function drainAt(x: number): number {
  return Math.abs(x - plugFt) * fallPerFt;
}

function branchAt(x: number, floor: DrawnFloor): number {
  return floor.heightFt - 0.5 + Math.abs(x - stackFt) * fallPerFt;
}

/** All drains, wastes and vents of a house, from its geometry. Groundwork, tested by a standpipe, ends above the slab. */
export function runsOf(house: DrawnHouse, method: DwvMethod | null, levelFt: number | null): Runs {
  const made: Runs = {
    runs: [{ points: [[plugFt, 0], [stackFt, drainAt(stackFt)]], nominalIn: 4 }],
    sewer: { points: [[-2.3, -0.094], [plugFt, 0]], nominalIn: 4 },
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
  addLowestFloor(made, house, lowest);
  upper.forEach((floor) => addUpperFloor(made, house, floor));
  if (house.laundryOutletFt !== null && method === 'laundry-riser' && levelFt !== null) {
    made.runs.push({ points: [[9.8, house.laundryOutletFt], [9.8, levelFt + 0.4]], nominalIn: 2 });
  }
  return made;
}

function addStack(made: Runs, house: DrawnHouse, lowest: DrawnFloor): void {
  made.runs.push(
    { points: [[stackFt, drainAt(stackFt)], [stackFt, house.ventFt]], nominalIn: 3 },
    { points: [[stackFt, lowest.heightFt + 1], [22.35, lowest.heightFt + 1.03]], nominalIn: 3 },
    { points: [[5.2, house.headerFt - 0.2], [stackFt, house.headerFt]], nominalIn: 1.5 },
  );
  made.openings.push({ at: [22.5, lowest.heightFt + 1.03], nominalIn: 3, isSideways: true });
  made.joints.push({ at: [stackFt, lowest.heightFt + 2.6], nominalIn: 3 }, { at: [stackFt, house.headerFt + 0.1], nominalIn: 3 });
}

function addLowestFloor(made: Runs, house: DrawnHouse, { heightFt: floor, hasLaundry }: DrawnFloor): void {
  made.runs.push(
    { points: [[5.2, drainAt(5.2)], [5.2, floor + 3.3]], nominalIn: 2 },
    { points: [[5.2, floor + 1.6], [3, floor + 1.646]], nominalIn: 1.5 },
    { points: [[5.2, floor + 3.3], [5.2, house.headerFt - 0.2]], nominalIn: 1.5 },
    { points: [[16.4, drainAt(16.4)], [16.4, floor]], nominalIn: 3 },
  );
  made.openings.push(
    { at: [2.9, floor + 1.65], nominalIn: 1.5, isSideways: true },
    { at: [16.4, floor + 0.1], nominalIn: 3 },
  );
  made.joints.push({ at: [5.2, 0.12], nominalIn: 2 }, { at: [16.4, 0.36], nominalIn: 3 }, { at: [5.2, floor + 1.65], nominalIn: 1.5 });
  if (hasLaundry) addLaundry(made, house, floor, [[11.8, floor + 1.12], [11.8, drainAt(11.8)]]);
}

function addUpperFloor(made: Runs, house: DrawnHouse, floor: DrawnFloor): void {
  const at = floor.heightFt;
  const branch = (x: number): number => branchAt(x, floor);
  made.runs.push(
    { points: [[17.4, branch(17.4)], [stackFt, at - 0.5]], nominalIn: 2 },
    { points: [[17.4, branch(17.4)], [17.4, at + 1.7]], nominalIn: 1.5 },
    { points: [[17.4, at + 1.7], [16.2, at + 1.725]], nominalIn: 1.5 },
    { points: [[17.4, at + 1.7], [17.4, house.headerFt - 0.06]], nominalIn: 1.5 },
    { points: [[stackFt, at - 0.5], [24.2, branch(24.2)], [24.2, at]], nominalIn: 3 },
    { points: [[24.2, branch(24.2)], [26, branch(26)], [27.25, branch(27.25)]], nominalIn: 2, trap: { riserFt: 27.93, topFt: at + 0.15 } },
    { points: [[26, branch(26)], [26, house.headerFt - 0.1]], nominalIn: 1.5 },
    { points: [[stackFt, house.headerFt], [26, house.headerFt - 0.1]], nominalIn: 1.5 },
  );
  made.openings.push(
    { at: [16.1, at + 1.73], nominalIn: 1.5, isSideways: true },
    { at: [24.2, at + 0.15], nominalIn: 3 },
    { at: [27.93, at + 0.3], nominalIn: 2 },
  );
  made.joints.push(
    { at: [stackFt, at - 0.4], nominalIn: 3 },
    { at: [stackFt, at + 4.6], nominalIn: 3 },
    { at: [17.4, at + 1.75], nominalIn: 1.5 },
    { at: [26, at - 0.25], nominalIn: 1.5 },
  );
  if (floor.hasLaundry) addLaundry(made, house, at, [[11.8, at + 1.12], [11.8, branch(11.8)], [17.4, branch(17.4)]]);
}

/** A standpipe with its trap 6 to 18 in above the floor, up into the laundry box. */
function addLaundry(made: Runs, house: DrawnHouse, floor: number, drain: readonly Feet[]): void {
  const outletFt = house.laundryOutletFt ?? floor + 3.5;
  made.runs.push(
    { points: drain, nominalIn: 2 },
    { points: [[11.8, floor + 1.12], [11.8, house.headerFt - 0.13]], nominalIn: 1.5 },
    { points: [[11.8, floor + 1.12], [10.62, floor + 1.145]], nominalIn: 2, trap: { riserFt: 9.8, topFt: outletFt - 0.1 } },
  );
  made.openings.push({ at: [9.8, outletFt], nominalIn: 2 });
  made.joints.push({ at: [11.8, floor + 1.25], nominalIn: 1.5 }, { at: [9.8, floor + 1.6], nominalIn: 2 });
}

function addGroundwork(made: Runs, { heightFt: floor }: DrawnFloor, levelFt: number | null): void {
  made.runs.push(
    { points: [[5.2, drainAt(5.2)], [5.2, Math.max(floor + 1, (levelFt ?? floor + 10) + 0.4)]], nominalIn: 3 },
    { points: [[16.4, drainAt(16.4)], [16.4, floor + 0.6]], nominalIn: 3 },
    { points: [[stackFt, drainAt(stackFt)], [stackFt, floor + 0.8]], nominalIn: 3 },
  );
  made.openings.push({ at: [16.4, floor + 0.7], nominalIn: 3 }, { at: [stackFt, floor + 0.9], nominalIn: 3 });
  made.joints.push({ at: [5.2, 0.3], nominalIn: 3 }, { at: [16.4, 0.36], nominalIn: 3 });
}
