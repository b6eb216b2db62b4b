import { withdrawInvitation } from '@holdwater/shared-types/accounts/organizations.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Takes an invitation back. */
export function useWithdrawInvitation(organizationId: string) {
  return useIdempotentMutation({
    mutationFn: (invitationId: string, options) =>
      call(withdrawInvitation, { params: { organizationId, invitationId } }, options),
    invalidates: () => [[...queryKeys.people, organizationId]],
  });
}
