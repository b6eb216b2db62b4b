import { type Actor, hasRole } from '../common/access/actor.js';
import { canAddReading, canTest, isImpartialInspectorOf, isPlumberOf, type LotParties } from '../lots/lots.policy.js';

/** Choose a method, start and end a test: the plumber alone. */
export function canStartHold(actor: Actor, lot: LotParties): boolean {
  return canTest(actor, lot);
}

export function canEndHold(actor: Actor, lot: LotParties): boolean {
  return canTest(actor, lot);
}

/** The plumber of the lot, or whoever made the reading and may still add one. */
export function canStrikeReading(actor: Actor, lot: LotParties, reading: { readonly byPerson: string }): boolean {
  return isPlumberOf(actor, lot) || (reading.byPerson === actor.personId && canAddReading(actor, lot));
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
