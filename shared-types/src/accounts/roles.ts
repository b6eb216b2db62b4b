import { z } from 'zod';

export const organizationKinds = ['builder', 'plumber', 'department'] as const;
export const organizationKind = z.enum(organizationKinds);
export type OrganizationKind = z.infer<typeof organizationKind>;

/** Roles a membership may carry. `operator` is no membership: it belongs to the installation. */
export const memberRoles = ['superintendent', 'plumber', 'helper', 'inspector', 'desk', 'owner'] as const;
export const memberRole = z.enum(memberRoles);
export type MemberRole = z.infer<typeof memberRole>;

export const rolesOfKind: Record<OrganizationKind, readonly MemberRole[]> = {
  builder: ['superintendent', 'owner'],
  plumber: ['plumber', 'helper', 'owner'],
  department: ['inspector', 'desk', 'owner'],
};
