import { stackFt, type DrawnFloor, type DrawnHouse } from './cutaway-house';
import { drainAt, fallPerFt, pipe, type Run, type Runs } from './cutaway-run';

function open(made: Runs, x: number, height: number, nominalIn: number, isSideways = false): void {
  made.openings.push({ at: [x, height], nominalIn, isSideways });
}

function prime(made: Runs, x: number, height: number, nominalIn: number): void {
  made.joints.push({ at: [x, height], nominalIn });
}

/** The stack from the drain to the vent terminal, its cleanout, and the vent line in the attic. */
export function addStack(made: Runs, house: DrawnHouse, lowest: DrawnFloor): void {
  const cleanout = lowest.heightFt + 1;
  made.runs.push(
    pipe(3, stackFt, drainAt(stackFt), stackFt, house.ventFt),
    pipe(3, stackFt, cleanout, 22.35, cleanout + 0.03),
    pipe(1.5, 5.2, house.headerFt - 0.2, stackFt, house.headerFt),
  );
  open(made, 22.5, cleanout + 0.03, 3, true);
  prime(made, stackFt, lowest.heightFt + 2.6, 3);
  prime(made, stackFt, house.headerFt + 0.1, 3);
}

/** Kitchen with its vent, and a closet, on the building drain. */
export function addLowestFloor(
  made: Runs,
  house: DrawnHouse,
  { heightFt: floor, hasLaundry }: DrawnFloor,
  riserTopFt: number | null,
): void {
  made.runs.push(
    pipe(2, 5.2, drainAt(5.2), 5.2, floor + 3.3),
    pipe(1.5, 5.2, floor + 1.6, 3, floor + 1.646),
    pipe(1.5, 5.2, floor + 3.3, 5.2, house.headerFt - 0.2),
    pipe(3, 16.4, drainAt(16.4), 16.4, floor),
  );
  open(made, 2.9, floor + 1.65, 1.5, true);
  open(made, 16.4, floor + 0.1, 3);
  prime(made, 5.2, 0.12, 2);
  prime(made, 16.4, 0.36, 3);
  prime(made, 5.2, floor + 1.65, 1.5);
  if (hasLaundry) addLaundry(made, house, floor, pipe(2, 11.8, floor + 1.12, 11.8, drainAt(11.8)), riserTopFt);
}

/** Lavatory left of the stack, closet and shower right of it, each falling to the branch under the floor. */
export function addUpperFloor(
  made: Runs,
  house: DrawnHouse,
  { heightFt: floor, hasLaundry }: DrawnFloor,
  riserTopFt: number | null,
): void {
  const branch = (x: number): number => floor - 0.5 + Math.abs(x - stackFt) * fallPerFt;
  const shower = pipe(2, 24.2, branch(24.2), 26, branch(26), 27.25, branch(27.25));
  made.runs.push(
    pipe(2, 17.4, branch(17.4), stackFt, branch(stackFt)),
    pipe(1.5, 17.4, branch(17.4), 17.4, floor + 1.7),
    pipe(1.5, 17.4, floor + 1.7, 16.2, floor + 1.725),
    pipe(1.5, 17.4, floor + 1.7, 17.4, house.headerFt - 0.06),
    pipe(3, stackFt, branch(stackFt), 24.2, branch(24.2), 24.2, floor),
    { ...shower, trap: { riserFt: 27.93, topFt: floor + 0.15 } },
    pipe(1.5, 26, branch(26), 26, house.headerFt - 0.1),
    pipe(1.5, stackFt, house.headerFt, 26, house.headerFt - 0.1),
  );
  open(made, 16.1, floor + 1.73, 1.5, true);
  open(made, 24.2, floor + 0.15, 3);
  open(made, 27.93, floor + 0.3, 2);
  prime(made, stackFt, floor - 0.4, 3);
  prime(made, stackFt, floor + 4.6, 3);
  prime(made, 17.4, floor + 1.75, 1.5);
  prime(made, 26, floor - 0.25, 1.5);
  const drain = pipe(2, 11.8, floor + 1.12, 11.8, branch(11.8), 17.4, branch(17.4));
  if (hasLaundry) addLaundry(made, house, floor, drain, riserTopFt);
}

/**
 * A standpipe with its trap 6 to 18 in above the floor, up into the laundry box. Under test by a riser, that stands on the branch in its
 * place, open at the top.
 */
function addLaundry(made: Runs, house: DrawnHouse, floor: number, drain: Run, riserTopFt: number | null): void {
  if (riserTopFt !== null) {
    const branch = floor + 1.12;
    const vent = pipe(1.5, 11.8, branch, 11.8, house.headerFt - 0.13);
    made.runs.push(drain, vent, pipe(2, 11.8, branch, 9.8, branch + 0.04, 9.8, Math.max(branch + 0.6, riserTopFt)));
    prime(made, 9.8, branch + 0.4, 2);
    return;
  }
  const outletFt = house.laundryOutletFt ?? floor + 3.5;
  const arm = pipe(2, 11.8, floor + 1.12, 10.62, floor + 1.145);
  made.runs.push(drain, pipe(1.5, 11.8, floor + 1.12, 11.8, house.headerFt - 0.13), {
    ...arm,
    trap: { riserFt: 9.8, topFt: outletFt - 0.1 },
  });
  open(made, 9.8, outletFt, 2);
  prime(made, 11.8, floor + 1.25, 1.5);
  prime(made, 9.8, floor + 1.6, 2);
}

/** Before the house stands: stubs through the slab, and the standpipe the water is held in. */
export function addGroundwork(made: Runs, { heightFt: floor }: DrawnFloor, levelFt: number | null): void {
  const topFt = Math.max(floor + 1, (levelFt ?? floor + 10) + 0.4);
  made.runs.push(
    pipe(3, 5.2, drainAt(5.2), 5.2, topFt),
    pipe(3, 16.4, drainAt(16.4), 16.4, floor + 0.6),
    pipe(3, stackFt, drainAt(stackFt), stackFt, floor + 0.8),
  );
  open(made, 16.4, floor + 0.7, 3);
  open(made, stackFt, floor + 0.9, 3);
  prime(made, 5.2, 0.3, 3);
  prime(made, 16.4, 0.36, 3);
}
