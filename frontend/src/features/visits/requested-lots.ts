import type { LotDetail, LotStage } from '@holdwater/shared-types/lots/lot.contract.js';

/** Why a lot cannot be asked for: `req.faults.<code>`. */
export interface LotFault {
  readonly code: 'mayNot' | 'noDepartment' | 'otherDepartment' | 'corrections' | 'passed' | 'noStage';
  readonly count?: number;
}

/** A lot of the request; `lot` null while it is read or when it cannot be. */
export interface ChosenLot {
  readonly id: string;
  readonly lot: LotDetail | null;
  readonly error: unknown;
  readonly fault: LotFault | null;
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
): LotFault | null {
  if (lot === undefined) return null;
  if (lot.departmentId === null) return { code: 'noDepartment' };
  if (!lot.abilities.canRequest) return { code: 'mayNot' };
  if (first !== undefined && lot.departmentId !== first.departmentId) return { code: 'otherDepartment' };
  if (lot.openCorrections > 0) return { code: 'corrections', count: lot.openCorrections };
  const stage = lot.stages.find(({ code }) => code === stageCode);
  if (stage === undefined) return { code: 'noStage' };
  return stage.state === 'clear' || stage.state === 'put-back-due' ? { code: 'passed' } : null;
}

/** The lots an error names, by their numbers. */
export function lotsNamed(params: Record<string, unknown>): string[] {
  const lots = params['lots'];
  return Array.isArray(lots) ? lots.filter((one): one is string => typeof one === 'string') : [];
}
