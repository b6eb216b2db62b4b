import type { LotDetail, LotStage } from '@holdwater/shared-types/lots/lot.contract.js';
import type { UnitToAsk } from './requested-units';

/** Why a lot cannot be asked for: `req.faults.<code>`. */
export interface LotFault {
  readonly code: 'mayNot' | 'noDepartment' | 'otherDepartment' | 'corrections' | 'passed' | 'noStage' | 'noUnit';
  readonly count?: number;
}

/** A lot of the request; `lot` null while it is read or when it cannot be. */
export interface ChosenLot {
  readonly id: string;
  readonly lot: LotDetail | null;
  readonly error: unknown;
  readonly fault: LotFault | null;
  /** Of a lot of several units: which may be asked for and which are; else none. */
  readonly units: readonly UnitToAsk[];
}

export type SharedStage = Pick<LotStage, 'code' | 'name' | 'systems' | 'order'>;

/** The stages that every one of these lots has, in the department's order. */
export function sharedStages(lots: readonly Pick<LotDetail, 'stages'>[]): SharedStage[] {
  const [first, ...others] = lots;
  if (first === undefined) return [];
  return first.stages
    .filter(({ code }) => others.every((lot) => lot.stages.some((stage) => stage.code === code)))
    .sort((a, b) => a.order - b.order);
}

/** What stands in the way on a lot, the first that applies; the server decides in the end. */
export function faultOf(
  lot: LotDetail | undefined,
  first: LotDetail | undefined,
  stageCode: string | null,
  units: readonly UnitToAsk[] = [],
): LotFault | null {
  if (lot === undefined) return null;
  if (lot.departmentId === null) return { code: 'noDepartment' };
  if (!lot.abilities.canRequest) return { code: 'mayNot' };
  if (first !== undefined && lot.departmentId !== first.departmentId) return { code: 'otherDepartment' };
  const stage = lot.stages.find(({ code }) => code === stageCode);
  const chosen = units.filter(({ isChosen }) => isChosen).map(({ number }) => number);
  if (lot.openCorrections > 0 && isInTheWay(stage, units, chosen)) {
    return { code: 'corrections', count: lot.openCorrections };
  }
  if (stage === undefined) return { code: 'noStage' };
  if (stage.state === 'clear' || stage.state === 'put-back-due') return { code: 'passed' };
  return units.length > 0 && chosen.length === 0 ? { code: 'noUnit' } : null;
}

/** A correction of one unit does not keep the other waiting. */
function isInTheWay(stage: LotStage | undefined, units: readonly UnitToAsk[], chosen: readonly number[]): boolean {
  if (stage === undefined || units.length === 0) return true;
  return stage.units.some(({ unitNumber, state }) => chosen.includes(unitNumber) && state === 'corrections-open');
}

/** The lots an error names, by their numbers. */
export function lotsNamed(params: Record<string, unknown>): string[] {
  const lots = params['lots'];
  return Array.isArray(lots) ? lots.filter((one): one is string => typeof one === 'string') : [];
}
