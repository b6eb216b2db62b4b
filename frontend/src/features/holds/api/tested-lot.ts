import { readLot } from '@holdwater/shared-types/lots/lot.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The lot whose tests are shown: its units, houses and what the reader may do. Shares its key with the lot sheet. */
export function testedLotQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'detail'),
    queryFn: ({ signal }) => call(readLot, { params: { lotId } }, { signal }),
  });
}
