import { type Actor, hasRole, isMember } from '../common/access/actor.js';

/** Whoever belongs to the organization asked sees what it is asked. */
export function canSeeConsents(actor: Actor, organizationId: string): boolean {
  return isMember(actor, organizationId);
}

/** For a builder its superintendents, for a contractor its plumbers, for a department its desk; for each its owner. */
export function canAnswerConsent(actor: Actor, organizationId: string): boolean {
  return hasRole(actor, organizationId, 'superintendent', 'plumber', 'desk', 'owner');
}

/** The role an answer is given in, for the record. */
export function answeringRole(
  actor: Actor,
  organizationId: string,
): 'superintendent' | 'plumber' | 'desk' | 'owner' | null {
  const roles = ['superintendent', 'plumber', 'desk', 'owner'] as const;
  return roles.find((role) => hasRole(actor, organizationId, role)) ?? null;
}
