import { changePassword } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { useMutation } from '@tanstack/react-query';
import { call } from '../../../lib/api';

/** Changes the password. Not kept for a repeat: a password is in it. */
export function useChangePassword() {
  return useMutation({
    mutationFn: (body: RouteCall<typeof changePassword>['body']) => call(changePassword, { body }),
  });
}
