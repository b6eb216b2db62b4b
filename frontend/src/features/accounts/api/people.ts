import { readPeople } from '@holdwater/shared-types/accounts/organizations.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The people of an organization and its open invitations. */
export function peopleQuery(organizationId: string) {
  return queryOptions({
    queryKey: [...queryKeys.people, organizationId],
    queryFn: ({ signal }) => call(readPeople, { params: { organizationId } }, { signal }),
  });
}
