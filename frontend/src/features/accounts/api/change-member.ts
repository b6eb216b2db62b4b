import { changeMember } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

type Change = RouteCall<typeof changeMember>['body'] & { personId: string };

/** Changes a person's roles here, or disables and enables them. */
export function useChangeMember(organizationId: string) {
  return useIdempotentMutation({
    mutationFn: ({ personId, ...body }: Change, options) =>
      call(changeMember, { params: { organizationId, personId }, body }, options),
    invalidates: () => [[...queryKeys.people, organizationId]],
  });
}
