import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { Me, OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';

/** Invented organizations and people for specs. */
export const odderly: OrganizationBrief = {
  id: '0b0f8a52-6c1e-4f6e-9a86-0d5d3a1f1c01',
  name: 'Odderly Homes',
  kind: 'builder',
  phone: '555-0142',
};
export const tallowmere: OrganizationBrief = {
  id: '0b0f8a52-6c1e-4f6e-9a86-0d5d3a1f1c02',
  name: 'Tallowmere Building Department',
  kind: 'department',
  phone: '555-0160',
};

/** Somebody signed in; a superintendent of Odderly Homes unless told otherwise. */
export function personOf(parts: Partial<Me> = {}, roles: MemberRole[] = ['superintendent']): Me {
  return {
    id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c10',
    name: 'Della Arkwright',
    email: 'della@odderly.example.test',
    phone: '555-0143',
    locale: 'en',
    units: 'us',
    isOperator: false,
    memberships: [{ organization: odderly, roles }],
    ...parts,
  };
}

export function sessionOf(me: Me, accessToken = 'token-1'): Session {
  return { accessToken, expiresAt: '2026-04-14T20:00:00Z', me };
}
