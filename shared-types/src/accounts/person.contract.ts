import { z } from 'zod';
import { id } from '../common/fields.js';
import { locale } from '../common/locale.js';
import { memberRole, organizationKind } from './roles.js';

export const organizationBrief = z.object({
  id,
  name: z.string(),
  kind: organizationKind,
  phone: z.string().nullable(),
});
export type OrganizationBrief = z.infer<typeof organizationBrief>;

export const personBrief = z.object({ id, name: z.string(), phone: z.string().nullable() });
export type PersonBrief = z.infer<typeof personBrief>;

export const units = z.enum(['us', 'metric']);

export const me = z.object({
  id,
  name: z.string(),
  email: z.string(),
  phone: z.string().nullable(),
  locale,
  units,
  isOperator: z.boolean(),
  memberships: z.array(z.object({ organization: organizationBrief, roles: z.array(memberRole) })),
});
export type Me = z.infer<typeof me>;
