import { listLotVisits } from '@holdwater/shared-types/visits/visit.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Every visit of a lot, newest first: which window the tests are to stand for. */
export function testedVisitsQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'visits'),
    queryFn: ({ signal }) => call(listLotVisits, { params: { lotId } }, { signal }),
  });
}
