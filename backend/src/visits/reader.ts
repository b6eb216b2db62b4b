import { type Actor, isMember, organizationIds } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';

/** The organizations a reader looks for: one of theirs, or all. Throws `not-found` for one that is not theirs. */
export function readerIdsOf(actor: Actor, organizationId: string | undefined): string[] {
  if (organizationId === undefined) return organizationIds(actor);
  return isMember(actor, organizationId) ? [organizationId] : refuse('not-found');
}

/** The actor as a member of these organizations only: what is on them there. */
export function actorIn(actor: Actor, readerIds: readonly string[]): Actor {
  return {
    ...actor,
    memberships: actor.memberships.filter((membership) => readerIds.includes(membership.organizationId)),
  };
}
