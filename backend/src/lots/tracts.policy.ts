import { type Actor, hasRole, isMember } from '../common/access/actor.js';

/** A tract without a lot one may read is known to its own builder only. */
export function canReadEmptyTract(actor: Actor, builderId: string): boolean {
  return isMember(actor, builderId);
}

export function canEditTracts(actor: Actor, builderId: string): boolean {
  return hasRole(actor, builderId, 'superintendent');
}
