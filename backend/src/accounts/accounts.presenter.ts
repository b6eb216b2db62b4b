import type { Invitation, Member } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { Me, OrganizationBrief, PersonBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { InvitationModel } from './invitation.model.js';
import type { OrganizationModel } from './organization.model.js';
import type { PersonModel } from './person.model.js';

/** What everyone who shares a lot may know of a person. */
export function briefOfPerson({ id, name, phone }: Pick<PersonModel, 'id' | 'name' | 'phone'>): PersonBrief {
  return { id, name, phone };
}

export function briefOfOrganization({
  id,
  name,
  kind,
  phone,
}: Pick<OrganizationModel, 'id' | 'name' | 'kind' | 'phone'>): OrganizationBrief {
  return { id, name, kind, phone };
}

export function presentMe(person: PersonModel, memberships: Me['memberships']): Me {
  const { id, name, email, phone, locale, units, isOperator } = person;
  return { id, name, email, phone, locale, units, isOperator, memberships };
}

export function presentMember(person: PersonModel, roles: readonly MemberRole[], isDisabled: boolean): Member {
  const { id, name, email, phone } = person;
  return { personId: id, name, email, phone, roles: [...roles], isDisabled };
}

export function presentInvitation({ id, email, name, roles, expiresAt }: InvitationModel): Invitation {
  return { id, email, name, roles, expiresAt: expiresAt.toISOString() };
}
