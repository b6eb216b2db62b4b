import { searchLots } from '@holdwater/shared-types/lots/lot.contract.js';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Lots by number, permit or address; the key is shared with the find box. */
export function searchLotsQuery(asked: string) {
  return queryOptions({
    queryKey: [...queryKeys.search, asked],
    queryFn: ({ signal }) => call(searchLots, { query: { q: asked } }, { signal }),
    enabled: asked !== '',
    placeholderData: keepPreviousData,
  });
}
