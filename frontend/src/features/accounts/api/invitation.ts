import { readInvitation } from '@holdwater/shared-types/accounts/auth.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';

/** What an invitation link invites to. It is a secret: kept no longer than the page is open. */
export function invitationQuery(token: string) {
  return queryOptions({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) => call(readInvitation, { body: { token } }, { signal }),
    gcTime: 0,
    staleTime: Infinity,
  });
}
