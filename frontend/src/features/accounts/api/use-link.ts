import {
  acceptInvitation,
  resetPassword,
  useSignInLink as signInLink,
} from '@holdwater/shared-types/accounts/auth.contract.js';
import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { useMutation } from '@tanstack/react-query';
import { useSession } from '../../../app/session';
import { call } from '../../../lib/api';

function useSigningIn<Body>(send: (body: Body) => Promise<Session>) {
  const { accept } = useSession();
  return useMutation({ mutationFn: send, onSuccess: accept });
}

/** Signs in with a mailed link; it works once. */
export function useMailedSignIn() {
  return useSigningIn((body: RouteCall<typeof signInLink>['body']) => call(signInLink, { body }));
}

/** Sets a new password with a mailed link and signs in. */
export function usePasswordReset() {
  return useSigningIn((body: RouteCall<typeof resetPassword>['body']) => call(resetPassword, { body }));
}

/** Joins an organization with an invitation and signs in. */
export function useInvitationAccept() {
  return useSigningIn((body: RouteCall<typeof acceptInvitation>['body']) => call(acceptInvitation, { body }));
}
