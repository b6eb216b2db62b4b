import { listCorrections } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The corrections of a lot; more than a page of them no lot has had. */
export function lotCorrectionsQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'corrections'),
    queryFn: ({ signal }) => call(listCorrections, { query: { lotId, limit: 200 } }, { signal }),
  });
}
