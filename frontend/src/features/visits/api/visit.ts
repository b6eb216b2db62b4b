import { readVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** One visit as it stands now, with the moves its reader may make. */
export function visitQuery(visitId: string) {
  return queryOptions({
    queryKey: queryKeys.visit(visitId),
    queryFn: ({ signal }) => call(readVisit, { params: { visitId } }, { signal }),
  });
}
