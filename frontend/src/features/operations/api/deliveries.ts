import { listDeliveries } from '@holdwater/shared-types/operations/operations.contract.js';
import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export type DeliveryFilter = 'waiting' | 'given-up';

/** Deliveries that wait or were given up, a page at a time. Nobody is told of changes here, so it is read anew by itself. */
export function deliveriesQuery(state: DeliveryFilter) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.deliveries, state],
    queryFn: ({ pageParam, signal }) => call(listDeliveries, { query: { state, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
    refetchInterval: 15_000,
  });
}
