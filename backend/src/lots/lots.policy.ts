import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';
import { type Actor, hasRole, isMember } from '../common/access/actor.js';

/** The parties of a lot; what every lot policy needs. */
export interface LotParties {
  readonly builderId: string;
  readonly plumberId: string | null;
  readonly departmentId: string | null;
  readonly mayPlumberRequest: boolean;
}

/** Reading: members of the three organizations, in whatever role, and nobody else. */
export function canReadLot(actor: Actor, lot: LotParties): boolean {
  return [lot.builderId, lot.plumberId, lot.departmentId].some((id) => id !== null && isMember(actor, id));
}

export function isSuperintendentOf(actor: Actor, lot: LotParties): boolean {
  return hasRole(actor, lot.builderId, 'superintendent');
}

export function isPlumberOf(actor: Actor, lot: LotParties): boolean {
  return hasRole(actor, lot.plumberId, 'plumber');
}

export function isHelperOf(actor: Actor, lot: LotParties): boolean {
  return hasRole(actor, lot.plumberId, 'helper');
}

export function isDeskOf(actor: Actor, lot: LotParties): boolean {
  return hasRole(actor, lot.departmentId, 'desk');
}

/** An inspector of the lot's department who does not belong to its builder or plumber, whatever other roles they hold. */
export function isImpartialInspectorOf(actor: Actor, lot: LotParties): boolean {
  return (
    hasRole(actor, lot.departmentId, 'inspector') && !isMember(actor, lot.builderId) && !isMember(actor, lot.plumberId)
  );
}

/** A new lot is its builder's. */
export function canAddLots(actor: Actor, builderId: string): boolean {
  return hasRole(actor, builderId, 'superintendent');
}

export function canEditLot(actor: Actor, lot: LotParties): boolean {
  return isSuperintendentOf(actor, lot);
}

export function canEditGeometry(actor: Actor, lot: LotParties): boolean {
  return isSuperintendentOf(actor, lot) || isPlumberOf(actor, lot);
}

/** The department's own fields: the permit. */
export function canSetPermit(actor: Actor, lot: LotParties): boolean {
  return isSuperintendentOf(actor, lot) || isDeskOf(actor, lot);
}

/** Builder's owner or superintendent; the one asked consents. */
export function canAttachParty(actor: Actor, lot: LotParties): boolean {
  return hasRole(actor, lot.builderId, 'superintendent', 'owner');
}

export function canRequestVisit(actor: Actor, lot: LotParties): boolean {
  return isSuperintendentOf(actor, lot) || (lot.mayPlumberRequest && isPlumberOf(actor, lot)) || isDeskOf(actor, lot);
}

/** Choose a method, start and end a test, say test up: the plumber alone. */
export function canTest(actor: Actor, lot: LotParties): boolean {
  return isPlumberOf(actor, lot);
}

export function canAddReading(actor: Actor, lot: LotParties): boolean {
  return readingRole(actor, lot) !== null;
}

/** The role a reading is added in; null for whoever may not. */
export function readingRole(
  actor: Actor,
  lot: LotParties,
): 'plumber' | 'helper' | 'superintendent' | 'inspector' | null {
  if (isPlumberOf(actor, lot)) return 'plumber';
  if (isHelperOf(actor, lot)) return 'helper';
  if (isSuperintendentOf(actor, lot)) return 'superintendent';
  return hasRole(actor, lot.departmentId, 'inspector') ? 'inspector' : null;
}

export function canFix(actor: Actor, lot: LotParties): boolean {
  return isPlumberOf(actor, lot);
}

/** Outcome, accept or reopen a correction. */
export function canDecide(actor: Actor, lot: LotParties): boolean {
  return isImpartialInspectorOf(actor, lot);
}

/** Everyone of the three but a bare owner. */
export function canComment(actor: Actor, lot: LotParties): boolean {
  return actingRole(actor, lot) !== null;
}

/** The role an act on this lot is done in, for the record: the strongest of the actor's. */
export function actingRole(actor: Actor, lot: LotParties): string | null {
  if (isSuperintendentOf(actor, lot)) return 'superintendent';
  if (isPlumberOf(actor, lot)) return 'plumber';
  if (isHelperOf(actor, lot)) return 'helper';
  if (hasRole(actor, lot.departmentId, 'inspector')) return 'inspector';
  return isDeskOf(actor, lot) ? 'desk' : null;
}

/** Gate code, contact and hazards: builder and plumber, and the inspector who comes that day. */
export function canSeeAccess(actor: Actor, lot: LotParties, isComingToday: boolean): boolean {
  return (
    isMember(actor, lot.builderId) ||
    isMember(actor, lot.plumberId) ||
    (isComingToday && hasRole(actor, lot.departmentId, 'inspector'))
  );
}

/** What the page shows by. */
export function lotAbilities(actor: Actor, lot: LotParties): LotAbilities {
  return {
    canEdit: canEditLot(actor, lot),
    canEditGeometry: canEditGeometry(actor, lot),
    canSetPermit: canSetPermit(actor, lot),
    canAttach: canAttachParty(actor, lot),
    canRequest: canRequestVisit(actor, lot),
    canTest: canTest(actor, lot),
    canAddReading: canAddReading(actor, lot),
    canSayTestUp: canTest(actor, lot),
    canFix: canFix(actor, lot),
    canDecide: canDecide(actor, lot),
    canComment: canComment(actor, lot),
  };
}
