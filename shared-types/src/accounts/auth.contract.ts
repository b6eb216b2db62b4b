import { z } from 'zod';
import { email, instant, line, phone } from '../common/fields.js';
import { locale } from '../common/locale.js';
import { done } from '../common/paging.js';
import { route } from '../common/route.js';
import { organizationBrief, me, units } from './person.contract.js';
import { memberRole } from './roles.js';

/** OWASP ASVS 5.0 6.2.1, 6.2.9: 8 at least, 64 and more allowed, no composition rules. */
export const newPassword = z.string().min(8, 'password-short').max(256, 'too-long');
const linkToken = z.string().min(20).max(200);

/** The access token lives in the page's memory; the refresh token travels in an httpOnly cookie only. */
export const session = z.object({ accessToken: z.string(), expiresAt: instant, me });
export type Session = z.infer<typeof session>;

export const signIn = route({
  method: 'POST',
  path: '/api/auth/sign-in',
  summary: 'Sign in with email and password',
  status: 200,
  body: z.strictObject({ email, password: z.string().min(1, 'required').max(256) }),
  answer: session,
});

export const refreshSession = route({
  method: 'POST',
  path: '/api/auth/refresh',
  summary: 'A new access token for the refresh cookie, which is replaced',
  status: 200,
  answer: session,
});

export const signOut = route({
  method: 'POST',
  path: '/api/auth/sign-out',
  summary: 'End this session',
  status: 200,
  answer: done,
});

export const signOutEverywhere = route({
  method: 'POST',
  path: '/api/auth/sign-out-everywhere',
  summary: 'End every session of this person',
  status: 200,
  answer: done,
});

export const askSignInLink = route({
  method: 'POST',
  path: '/api/auth/sign-in-link',
  summary: 'Mail a single-use sign-in link; the answer never tells whether the address is known',
  status: 202,
  body: z.strictObject({ email }),
  answer: done,
});

export const useSignInLink = route({
  method: 'POST',
  path: '/api/auth/sign-in-link/use',
  summary: 'Sign in with a mailed link',
  status: 200,
  body: z.strictObject({ token: linkToken }),
  answer: session,
});

export const askPasswordReset = route({
  method: 'POST',
  path: '/api/auth/password-reset',
  summary: 'Mail a link to set a new password',
  status: 202,
  body: z.strictObject({ email }),
  answer: done,
});

export const resetPassword = route({
  method: 'POST',
  path: '/api/auth/password-reset/use',
  summary: 'Set a new password with a mailed link; ends every other session',
  status: 200,
  body: z.strictObject({ token: linkToken, password: newPassword }),
  answer: session,
});

export const readInvitation = route({
  method: 'POST',
  path: '/api/auth/invitation',
  summary: 'What an invitation link invites to',
  status: 200,
  body: z.strictObject({ token: linkToken }),
  answer: z.object({
    /** Empty for the installation's first operator, who names it. */
    email: z.string(),
    name: z.string(),
    /** Null for the installation's first operator. */
    organization: organizationBrief.nullable(),
    roles: z.array(memberRole),
    /** A person who already has a password signs in with it instead of choosing one. */
    hasPassword: z.boolean(),
  }),
});

export const acceptInvitation = route({
  method: 'POST',
  path: '/api/auth/invitation/accept',
  summary: 'Join the organization; a new person chooses name and password',
  status: 200,
  body: z.strictObject({
    token: linkToken,
    /** Needed where the invitation names no address: the installation's first operator. */
    email: email.optional(),
    name: line(120).optional(),
    password: z.string().max(256).optional(),
    locale: locale.optional(),
  }),
  answer: session,
});

export const readMe = route({ method: 'GET', path: '/api/me', summary: 'Who is signed in', status: 200, answer: me });

export const updateMe = route({
  method: 'PATCH',
  path: '/api/me',
  summary: 'Change own name, telephone, language or units',
  status: 200,
  body: z.strictObject({
    name: line(120).optional(),
    phone: phone.nullable().optional(),
    locale: locale.optional(),
    units: units.optional(),
  }),
  answer: me,
});

export const changePassword = route({
  method: 'POST',
  path: '/api/me/password',
  summary: 'Change the password; ends every other session',
  status: 200,
  body: z.strictObject({ currentPassword: z.string().min(1).max(256), password: newPassword }),
  answer: done,
});
