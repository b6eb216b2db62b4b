import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { importLots } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Builder: tries a list of lots, or adds them all; one fault and nothing is added. */
export function useImportLots() {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof importLots>['body'], options) => call(importLots, { body }, options),
    invalidates: ({ isImported }) =>
      isImported ? [queryKeys.lots, queryKeys.tracts, queryKeys.search, queryKeys.waiting] : [],
  });
}
