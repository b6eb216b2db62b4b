import { createOrganization } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Adds an organization and invites its first owner. */
export function useCreateOrganization() {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof createOrganization>['body'], options) =>
      call(createOrganization, { body }, options),
    invalidates: () => [queryKeys.organizations, queryKeys.departments],
  });
}
