import { readLot } from '@holdwater/shared-types/lots/lot.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** A lot of a request: what may be asked for it, its stages and what stands in the way. Shares its key with the lot sheet. */
export function requestedLotQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'detail'),
    queryFn: ({ signal }) => call(readLot, { params: { lotId } }, { signal }),
  });
}
