import { listOrganizations } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Organizations that may be asked to join a lot, by kind and the beginning of a name. */
export function partiesQuery(kind: OrganizationKind, q: string) {
  return queryOptions({
    queryKey: [...queryKeys.organizations, 'parties', kind, q],
    queryFn: ({ signal }) =>
      call(listOrganizations, { query: { kind, q: q === '' ? undefined : q, limit: 12 } }, { signal }),
    placeholderData: keepPreviousData,
  });
}
