import { signIn } from '@holdwater/shared-types/accounts/auth.contract.js';
import { useMutation } from '@tanstack/react-query';
import { useSession } from '../../../app/session';
import { call } from '../../../lib/api';

/** Signs in with email and password. */
export function useSignIn() {
  const { accept } = useSession();
  return useMutation({
    mutationFn: (body: { email: string; password: string }) => call(signIn, { body }),
    onSuccess: accept,
  });
}
