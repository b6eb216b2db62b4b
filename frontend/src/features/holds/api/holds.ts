import { listHolds } from '@holdwater/shared-types/holds/hold.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The tests of a lot with their readings, newest first. */
export function holdsQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'holds'),
    queryFn: ({ signal }) => call(listHolds, { params: { lotId } }, { signal }),
  });
}
