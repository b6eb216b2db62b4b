import { listRequests } from '@holdwater/shared-types/visits/visit.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Desk: requests to place, those that keep first place before the others, oldest first. */
export function requestsQuery(departmentId: string) {
  return queryOptions({
    queryKey: [...queryKeys.requests, departmentId],
    queryFn: ({ signal }) => call(listRequests, { params: { departmentId } }, { signal }),
  });
}
