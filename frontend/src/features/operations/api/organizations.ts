import { listOrganizations } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export interface OrganizationFilter {
  readonly kind: OrganizationKind | undefined;
  readonly q: string | undefined;
}

/** The organizations of the installation, a page at a time. */
export function organizationsQuery(filter: OrganizationFilter) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.organizations, filter],
    queryFn: ({ pageParam, signal }) =>
      call(listOrganizations, { query: { ...filter, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
  });
}
