import { readLotLedger, verifyLotLedger } from '@holdwater/shared-types/ledger/ledger.contract.js';
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** What changed on a lot, newest first, some at a time. */
export function lotLedgerQuery(lotId: string) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'ledger'), 'changes'],
    queryFn: ({ pageParam, signal }) =>
      call(readLotLedger, { params: { lotId }, query: { limit: 10, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });
}

/** Whether the chain of a lot is whole, worked out anew by the server. */
export function lotLedgerCheckQuery(lotId: string) {
  return queryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'ledger'), 'check'],
    queryFn: ({ signal }) => call(verifyLotLedger, { params: { lotId } }, { signal }),
  });
}
