import { readLot } from '@holdwater/shared-types/lots/lot.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** One lot with what this reader may see and do. */
export function lotQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'detail'),
    queryFn: ({ signal }) => call(readLot, { params: { lotId } }, { signal }),
  });
}
