import { type MemberRole, type OrganizationKind, rolesOfKind } from '@holdwater/shared-types/accounts/roles.js';
import { type Actor, hasRole, isMember } from '../common/access/actor.js';

/** The people of an organization are seen by its members, whatever their role. */
export function canReadPeople(actor: Actor, organizationId: string): boolean {
  return isMember(actor, organizationId);
}

/** Invite, withdraw, change roles, disable: the owner. */
export function canManagePeople(actor: Actor, organizationId: string): boolean {
  return hasRole(actor, organizationId, 'owner');
}

/** Which of these roles nobody may have in an organization of this kind. */
export function rolesAmiss(kind: OrganizationKind, roles: readonly MemberRole[]): MemberRole[] {
  return roles.filter((role) => !rolesOfKind[kind].includes(role));
}

export interface Ownership {
  personId: string;
  roles: readonly MemberRole[];
  /** Disabled here or altogether. */
  isDisabled: boolean;
}

/** Whether an organization keeps an owner who can act once this person has these roles. */
export function keepsOwner(members: readonly Ownership[], after: Ownership): boolean {
  return [...members.filter((member) => member.personId !== after.personId), after].some(
    (member) => !member.isDisabled && member.roles.includes('owner'),
  );
}
