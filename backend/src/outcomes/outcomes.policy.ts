import type { CorrectionState } from '@holdwater/shared-types/outcomes/correction.states.js';
import type { Actor } from '../common/access/actor.js';
import { canDecide, canFix, type LotParties } from '../lots/lots.policy.js';

interface InNameOf {
  readonly inspectorId: string | null;
}

/** Begin a visit or record its outcome: an inspector of the department who belongs neither to the lot's builder nor to its plumber. */
export function canInspect(actor: Actor, lot: LotParties): boolean {
  return canDecide(actor, lot);
}

/** Whether the visit stands in the actor's own name: on the own run, or taken over. */
export function isOwnVisit(actor: Actor, visit: InNameOf): boolean {
  return visit.inspectorId === actor.personId;
}

/** Mark a correction fixed: the plumber of the lot. */
export function canFixCorrection(actor: Actor, lot: LotParties): boolean {
  return canFix(actor, lot);
}

/** Accept or reopen: any impartial inspector of the department. */
export function canDecideCorrection(actor: Actor, lot: LotParties): boolean {
  return canDecide(actor, lot);
}

/** What the page shows by: only what the state of the correction allows now. */
export function correctionAbilities(actor: Actor, lot: LotParties, state: CorrectionState) {
  return {
    canFix: state === 'open' && canFixCorrection(actor, lot),
    canDecide: state === 'fixed' && canDecideCorrection(actor, lot),
  };
}
