import { type Actor, hasRole, isMember } from '../common/access/actor.js';

/** Whoever belongs to the organization asked sees what it is asked. */
export function canSeeConsents(actor: Actor, organizationId: string): boolean {
  return isMember(actor, organizationId);
}

/** For a contractor its plumbers or owner, for a department its desk or owner. */
export function canAnswerConsent(actor: Actor, organizationId: string): boolean {
  return hasRole(actor, organizationId, 'plumber', 'desk', 'owner');
}

/** The role an answer is given in, for the record. */
export function answeringRole(actor: Actor, organizationId: string): 'plumber' | 'desk' | 'owner' | null {
  const roles = ['plumber', 'desk', 'owner'] as const;
  return roles.find((role) => hasRole(actor, organizationId, role)) ?? null;
}
