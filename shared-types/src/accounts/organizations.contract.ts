import { z } from 'zod';
import { email, id, instant, line, phone, zone } from '../common/fields.js';
import { done, pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';
import { siteElevationFt } from '../hydraulics/field-kinds.js';
import { organizationBrief } from './person.contract.js';
import { memberRole, organizationKind } from './roles.js';

export const member = z.object({
  personId: id,
  name: z.string(),
  email: z.string(),
  phone: z.string().nullable(),
  roles: z.array(memberRole),
  isDisabled: z.boolean(),
});
export type Member = z.infer<typeof member>;

export const invitation = z.object({
  id,
  email: z.string(),
  name: z.string(),
  roles: z.array(memberRole),
  expiresAt: instant,
});
export type Invitation = z.infer<typeof invitation>;

export const listOrganizations = route({
  method: 'GET',
  path: '/api/organizations',
  summary: 'The organizations one may tie to a lot, by kind and name',
  status: 200,
  query: z.object({ ...pageQuery, kind: organizationKind.optional(), q: z.string().max(100).optional() }),
  answer: pageOf(organizationBrief),
});

const newOrganization = z
  .strictObject({
    name: line(120),
    kind: organizationKind,
    phone: phone.optional(),
    ownerEmail: email,
    ownerName: line(120),
    /** A department's own; others have neither. */
    zone: zone.optional(),
    elevationFt: siteElevationFt.optional(),
  })
  .superRefine((organization, ctx) => {
    if (organization.kind !== 'department') return;
    for (const path of ['zone', 'elevationFt'] as const) {
      if (organization[path] === undefined) ctx.addIssue({ code: 'custom', message: 'required', path: [path] });
    }
  });

export const createOrganization = route({
  method: 'POST',
  path: '/api/organizations',
  summary: 'Operator: add an organization and invite its first owner',
  status: 201,
  body: newOrganization,
  answer: organizationBrief,
});

export const readPeople = route({
  method: 'GET',
  path: '/api/organizations/:organizationId/people',
  summary: 'The people of an organization and its open invitations; members only',
  status: 200,
  params: z.object({ organizationId: id }),
  answer: z.object({
    organization: organizationBrief,
    people: z.array(member),
    invitations: z.array(invitation),
    abilities: z.object({ canManage: z.boolean() }),
  }),
});

export const invitePerson = route({
  method: 'POST',
  path: '/api/organizations/:organizationId/invitations',
  summary: 'Owner: invite a person by email',
  status: 201,
  params: z.object({ organizationId: id }),
  body: z.strictObject({ email, name: line(120), roles: z.array(memberRole).min(1, 'required').max(6) }),
  answer: invitation,
});

export const withdrawInvitation = route({
  method: 'DELETE',
  path: '/api/organizations/:organizationId/invitations/:invitationId',
  summary: 'Owner: take an invitation back',
  status: 200,
  params: z.object({ organizationId: id, invitationId: id }),
  answer: done,
});

export const changeMember = route({
  method: 'PATCH',
  path: '/api/organizations/:organizationId/people/:personId',
  summary: 'Owner: change roles, or disable a person here, which takes effect at once',
  status: 200,
  params: z.object({ organizationId: id, personId: id }),
  body: z.strictObject({
    roles: z.array(memberRole).min(1, 'required').max(6).optional(),
    isDisabled: z.boolean().optional(),
  }),
  answer: member,
});
