import { readOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** What a closed visit found, system by system. */
export function visitOutcomeQuery(lotId: string, visitId: string) {
  return queryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'outcomes'), visitId],
    queryFn: ({ signal }) => call(readOutcome, { params: { visitId } }, { signal }),
  });
}
