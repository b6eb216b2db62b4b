import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { createTract } from '@holdwater/shared-types/lots/tract.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Builder: adds a tract. */
export function useCreateTract() {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof createTract>['body'], options) => call(createTract, { body }, options),
    invalidates: () => [queryKeys.tracts],
  });
}
