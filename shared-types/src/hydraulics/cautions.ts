import type { DwvMethod, Medium } from '../holds/hold.states.js';
import type { PlugLoad } from './dwv-plan.contract.js';
import { cautionOf, when, type Caution, type CautionCode, type FindingParams } from './findings.js';
import type { Floor } from './house-fields.js';
import { isAbove } from './tolerance.js';

/** A plug loaded beyond this share of its rating is spoken of by name. */
const loadWorthAWord = 0.8;

/** Said with every plan: the local code, the department and a licensed plumber decide. */
export const localCode = (): Caution => cautionOf('local-code');

const placeCautions: Readonly<Partial<Record<DwvMethod, readonly CautionCode[]>>> = {
  'attic-cut': ['attic'],
  'stack-to-roof': ['roof', 'ladder'],
  standpipe: ['trench'],
};

interface DwvSituation {
  method: DwvMethod;
  fillLevelFt: number | null;
  floors: readonly Floor[];
  loads: readonly PlugLoad[];
  volumeGal: number | null;
  air: { pressurePsi: number; energyFtLbf: number } | null;
}

/** Cautions of a DWV plan. */
export function dwvPlanCautions({ method, fillLevelFt, floors, loads, volumeGal, air }: DwvSituation): Caution[] {
  const bare = floors
    .filter((floor) => fillLevelFt !== null && isAbove(floor.elevationFt, fillLevelFt))
    .map(({ name }) => name);
  return [
    ...(air ? [cautionOf('compressed-air', air), cautionOf('under-pressure', { pressurePsi: air.pressurePsi })] : []),
    ...loads.filter(({ loadFraction }) => isAbove(loadFraction, loadWorthAWord)).map(plugLoadCaution),
    ...when(loads.length > 0, () => cautionOf('plug-stand-aside')),
    ...when(bare.length > 0, () => cautionOf('floors-not-under-test', { floors: bare })),
    ...(volumeGal === null ? [] : [cautionOf('discharge', { volumeGal }), cautionOf('backflow')]),
    ...(placeCautions[method] ?? []).map((code) => cautionOf(code)),
    localCode(),
  ];
}

const plugLoadCaution = ({ name, loadFraction, pressurePsi, forceLbf }: PlugLoad): Caution =>
  cautionOf('plug-load', { name, loadFraction, pressurePsi, ...(forceLbf === null ? {} : { forceLbf }) });

interface WaterSituation {
  medium: Medium;
  targetPsi: number;
  needsTopUp: boolean | null;
  storedEnergyFtLbf: number | null;
}

/** Cautions of a water plan. Where the street pressure is unknown, the main is to be shut as if it were too low. */
export function waterPlanCautions({ medium, targetPsi, needsTopUp, storedEnergyFtLbf }: WaterSituation): Caution[] {
  const energy: FindingParams = storedEnergyFtLbf === null ? {} : { energyFtLbf: storedEnergyFtLbf };
  return [
    ...when(medium !== 'water', () => cautionOf('compressed-air', { pressurePsi: targetPsi, ...energy })),
    cautionOf('under-pressure', { pressurePsi: targetPsi }),
    ...(medium === 'air' ? [] : [cautionOf('backflow'), cautionOf('potable-only')]),
    ...when(needsTopUp !== false, () => cautionOf('close-the-main')),
    cautionOf('relief-valve'),
    localCode(),
  ];
}
