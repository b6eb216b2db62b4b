import { type Actor, hasRole } from '../common/access/actor.js';
import {
  canAddReading,
  canTest,
  isHelperOf,
  isImpartialInspectorOf,
  isPlumberOf,
  type LotParties,
} from '../lots/lots.policy.js';

/** Choose a method, start and end a test: the plumber alone. */
export function canStartHold(actor: Actor, lot: LotParties): boolean {
  return canTest(actor, lot);
}

export function canEndHold(actor: Actor, lot: LotParties): boolean {
  return canTest(actor, lot);
}

/** What of a reading and its test decides who may strike it. */
export interface StruckFacts {
  readonly byPerson: string;
  readonly byRole: 'plumber' | 'helper' | 'superintendent' | 'inspector';
  /** The plumbing contractor whose test it is; its plumbers and helpers read in its name. */
  readonly plumberId: string;
}

/**
 * Whoever made the reading and may still add one; for a reading of the plumbing contractor also its other plumbers and helpers, while it
 * is on the lot. Nobody strikes what another organization read.
 */
export function canStrikeReading(actor: Actor, lot: LotParties, reading: StruckFacts): boolean {
  if (reading.byPerson === actor.personId) return canAddReading(actor, lot);
  const isOfPlumber = reading.byRole === 'plumber' || reading.byRole === 'helper';
  const isOfCrew = isPlumberOf(actor, lot) || isHelperOf(actor, lot);
  return isOfPlumber && isOfCrew && reading.plumberId === lot.plumberId;
}

export function canSayTestUp(actor: Actor, lot: LotParties): boolean {
  return canTest(actor, lot);
}

/** By which move this person may say that the test is down again; null for whoever may not. */
export function downMoveOf(
  actor: Actor,
  lot: LotParties,
  visit: { readonly inspectorId: string | null },
): 'no-longer-up' | 'find-not-up' | null {
  if (isPlumberOf(actor, lot)) return 'no-longer-up';
  return isImpartialInspectorOf(actor, lot) && visit.inspectorId === actor.personId ? 'find-not-up' : null;
}

/** An inspector of the department, but the visit stands in the name of another. */
export function isVisitOfAnother(
  actor: Actor,
  lot: LotParties,
  visit: { readonly inspectorId: string | null },
): boolean {
  return hasRole(actor, lot.departmentId, 'inspector') && visit.inspectorId !== actor.personId;
}
