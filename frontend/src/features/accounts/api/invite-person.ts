import { invitePerson } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Invites a person by email. */
export function useInvitePerson(organizationId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof invitePerson>['body'], options) =>
      call(invitePerson, { params: { organizationId }, body }, options),
    invalidates: () => [[...queryKeys.people, organizationId]],
  });
}
