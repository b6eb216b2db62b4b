import { readOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** What was recorded at a visit that is closed. */
export function outcomeQuery(visitId: string) {
  return queryOptions({
    queryKey: [...queryKeys.visit(visitId), 'outcome'],
    queryFn: ({ signal }) => call(readOutcome, { params: { visitId } }, { signal }),
  });
}
