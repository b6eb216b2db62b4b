import type { DwvMethod } from '../holds/hold.states.js';
import type { DwvPlanFields } from './dwv-plan.fields.js';
import { defaultOverlapFt, sectionCount } from './dwv-lifts.js';
import { fillPath, ownFillLevelFt } from './dwv-fill-level.js';
import {
  refuseAbove,
  refuseFloorsNamedTwice,
  refusePipesUpsideDown,
  refuseUnknownLaundryFloor,
  type Refuse,
} from './house-refusals.js';
import { hydraulicLimits } from './hydraulic-limits.js';
import { isBelow } from './tolerance.js';

type Path = readonly string[];

const neededByMethod: Readonly<Record<DwvMethod, readonly Path[]>> = {
  'stack-to-roof': [],
  'attic-cut': [['atticCutFt']],
  'laundry-box': [['laundry'], ['laundry', 'boxOutletFt']],
  'laundry-riser': [['laundry'], ['laundry', 'branchFt']],
  standpipe: [['standpipeFt']],
  sectional: [['maxSectionFt']],
  air: [['airPsi'], ['airVolumeGal'], ['pipeMaterial']],
};

/** Everything that is wrong with a DWV plan's input beyond its single fields; what the chosen method does not use is left alone. */
export function refuseDwvInput(input: DwvPlanFields, refuse: Refuse): void {
  refuseFloorsNamedTwice(input.floors, refuse);
  refusePipesUpsideDown(input.pipes, refuse);
  refuseAbove(input.lowestFittingFt, input.highestFittingFt, ['lowestFittingFt'], 'lowest-above-highest', refuse);
  refuseMissing(input, refuse);
  if (input.method === 'air') return;
  refuseAbove(input.lowestFittingFt, input.ventTerminalFt, ['ventTerminalFt'], 'ends-before-it-starts', refuse);
  refuseAbove(ownFillLevelFt(input), input.ventTerminalFt, fillPath(input.method), 'level-above-vent-terminal', refuse);
  if (isLaundryMethod(input.method) && input.laundry) refuseUnknownLaundryFloor(input.laundry, input.floors, refuse);
  if (input.method === 'sectional') refuseSections(input, refuse);
}

const isLaundryMethod = (method: DwvMethod): boolean => method === 'laundry-box' || method === 'laundry-riser';

function refuseMissing(input: DwvPlanFields, refuse: Refuse): void {
  const paths: Path[] = [...neededByMethod[input.method]];
  if (input.method !== 'air') paths.push(['ventTerminalFt']);
  if (input.method !== 'air' && input.method !== 'sectional') paths.push(['rule', 'headRule']);
  for (const path of paths) if (isMissing(input, path)) refuse(path, 'required');
}

/** Is the last step of `path` absent, though what holds it is there (a missing holder is refused by itself)? */
function isMissing(input: unknown, path: Path): boolean {
  let value: unknown = input;
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return false;
    value = (value as Readonly<Record<string, unknown>>)[key];
  }
  return value === null || value === undefined;
}

function refuseSections(input: DwvPlanFields, refuse: Refuse): void {
  const { maxSectionFt, ventTerminalFt, lowestFittingFt } = input;
  if (maxSectionFt === null || ventTerminalFt === null) return;
  const overlapFt = input.rule.headRule?.feet ?? defaultOverlapFt;
  if (!isBelow(overlapFt, maxSectionFt)) return refuse(['maxSectionFt'], 'overlap-not-below-section');
  const sections = sectionCount(ventTerminalFt - lowestFittingFt, maxSectionFt, overlapFt);
  if (sections > hydraulicLimits.lifts) refuse(['maxSectionFt'], 'too-many-sections');
}
