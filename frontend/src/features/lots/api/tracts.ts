import { listTracts } from '@holdwater/shared-types/lots/tract.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Tracts with a lot the reader may see, and those of the own builder, with their plats. */
export function tractsQuery() {
  return queryOptions({
    queryKey: queryKeys.tracts,
    queryFn: ({ signal }) => call(listTracts, {}, { signal }),
  });
}
