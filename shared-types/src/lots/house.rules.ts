import { houseGeometry, type HouseGeometry } from '../hydraulics/house-geometry.js';
import { refuseAbove, refuseIn, type Refuse } from '../hydraulics/house-refusals.js';
import { isAbove, isBelow } from '../hydraulics/tolerance.js';

/** What a house is refused for beside the codes of the computations; they are values of `fields` and have words in both languages. */
export const houseIssueCodes = [
  'floor-named-twice',
  'floor-out-of-order',
  'below-highest-fitting',
  'size-missing',
  'shorter-than-its-rise',
  'trap-above-box',
  'trap-below-branch',
  'branch-above-box',
  'no-laundry',
  'material-not-listed',
] as const;
export type HouseIssueCode = (typeof houseIssueCodes)[number];

type RefuseHouse = (path: Parameters<Refuse>[0], code: HouseIssueCode) => void;

/**
 * A house as it may be saved, by page and server alike. Stricter than `houseGeometry`, which also reads what was saved under older rules and
 * what the computations are given piecemeal. What nobody measured is not refused.
 */
export const houseToSave = houseGeometry.superRefine((house, ctx) => {
  refuseAbove(
    house.highestFittingFt,
    house.ventTerminalFt,
    ['highestFittingFt'],
    'level-above-vent-terminal',
    refuseIn(ctx),
  );
  const refuse: RefuseHouse = (path, code) => ctx.addIssue({ code: 'custom', message: code, path: [...path] });
  refuseFloors(house, refuse);
  refuseCut(house, refuse);
  refusePlugs(house, refuse);
  refuseShortPipes(house, refuse);
  refuseLaundry(house, refuse);
  refuseUnlistedMaterials(house, refuse);
});

/** Floors go up, one above the other; a name that differs in its letters' case or in blanks alone is the same name to whoever reads it. */
function refuseFloors({ floors }: HouseGeometry, refuse: RefuseHouse): void {
  const seen = new Map<string, string>();
  floors.forEach(({ name, elevationFt }, index) => {
    const plain = name.trim().toLowerCase();
    const known = seen.get(plain);
    // the very same name is refused by `houseGeometry` already
    if (known !== undefined && known !== name) refuse(['floors', index, 'name'], 'floor-named-twice');
    seen.set(plain, known ?? name);
    const below = floors[index - 1];
    if (below && !isAbove(elevationFt, below.elevationFt))
      refuse(['floors', index, 'elevationFt'], 'floor-out-of-order');
  });
}

/** A vent is cut above every fitting, or the fittings over the cut could not be filled. */
function refuseCut({ atticCutFt, highestFittingFt }: HouseGeometry, refuse: RefuseHouse): void {
  if (atticCutFt !== null && highestFittingFt !== null && isBelow(atticCutFt, highestFittingFt))
    refuse(['atticCutFt'], 'below-highest-fitting');
}

/** The push on a plug is worked out from its size. */
function refusePlugs({ plugs }: HouseGeometry, refuse: RefuseHouse): void {
  plugs.forEach(({ nominalIn }, index) => {
    if (nominalIn === null) refuse(['plugs', index, 'nominalIn'], 'size-missing');
  });
}

/** A pipe is as long as it rises, or longer. */
function refuseShortPipes({ pipes }: HouseGeometry, refuse: RefuseHouse): void {
  pipes.forEach(({ bottomFt, topFt, lengthFt }, index) => {
    if (isBelow(lengthFt, topFt - bottomFt)) refuse(['pipes', index, 'lengthFt'], 'shorter-than-its-rise');
  });
}

/** From the box the laundry drains down: box outlet, trap, branch. */
function refuseLaundry({ laundry, laundryTrapFt: trapFt }: HouseGeometry, refuse: RefuseHouse): void {
  if (laundry === null) {
    if (trapFt !== null) refuse(['laundryTrapFt'], 'no-laundry');
    return;
  }
  const { boxOutletFt, branchFt } = laundry;
  if (branchFt !== null && boxOutletFt !== null && isAbove(branchFt, boxOutletFt))
    refuse(['laundry', 'branchFt'], 'branch-above-box');
  if (trapFt === null) return;
  if (boxOutletFt !== null && isAbove(trapFt, boxOutletFt)) refuse(['laundryTrapFt'], 'trap-above-box');
  if (branchFt !== null && isBelow(trapFt, branchFt)) refuse(['laundryTrapFt'], 'trap-below-branch');
}

/** Air may not go into some materials, so none may be in the lines that the list leaves out. */
function refuseUnlistedMaterials({ waterPipes, waterPipeMaterials }: HouseGeometry, refuse: RefuseHouse): void {
  waterPipes.forEach(({ material }, index) => {
    if (!waterPipeMaterials.includes(material)) refuse(['waterPipes', index, 'material'], 'material-not-listed');
  });
}
