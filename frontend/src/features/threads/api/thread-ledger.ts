import { readLotLedger } from '@holdwater/shared-types/ledger/ledger.contract.js';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** What changed on a lot, as the thin lines between its words; newest first, some at a time. */
export function threadLedgerQuery(lotId: string) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'ledger'), 'thread'],
    queryFn: ({ pageParam, signal }) =>
      call(readLotLedger, { params: { lotId }, query: { limit: 100, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });
}
