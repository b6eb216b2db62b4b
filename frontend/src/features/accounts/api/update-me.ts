import { updateMe } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { useSession } from '../../../app/session';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';

/** Changes one's own name, telephone, language or units. */
export function useUpdateMe() {
  const { replaceMe } = useSession();
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof updateMe>['body'], options) => call(updateMe, { body }, options),
    onDone: replaceMe,
  });
}
