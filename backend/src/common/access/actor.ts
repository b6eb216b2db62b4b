import type { MemberRole, OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';

/** Who asks, with every organization and role of theirs that is in force. */
export interface Actor {
  readonly personId: string;
  readonly sessionId: string;
  readonly name: string;
  readonly isOperator: boolean;
  readonly memberships: readonly ActorMembership[];
}

export interface ActorMembership {
  readonly organizationId: string;
  readonly kind: OrganizationKind;
  readonly roles: readonly MemberRole[];
}

/** Whether the actor belongs to an organization, in whatever role. */
export function isMember(actor: Actor, organizationId: string | null): boolean {
  return actor.memberships.some((membership) => membership.organizationId === organizationId);
}

/** Whether the actor has one of these roles in an organization. */
export function hasRole(actor: Actor, organizationId: string | null, ...roles: MemberRole[]): boolean {
  return actor.memberships.some(
    (membership) =>
      membership.organizationId === organizationId && membership.roles.some((role) => roles.includes(role)),
  );
}

export function organizationIds(actor: Actor): string[] {
  return actor.memberships.map((membership) => membership.organizationId);
}
