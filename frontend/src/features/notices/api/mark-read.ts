import { markNoticesRead } from '@holdwater/shared-types/notices/notice.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Marks these of the reader's notices as read. */
export function useMarkRead() {
  return useIdempotentMutation({
    mutationFn: (ids: readonly string[], options) => call(markNoticesRead, { body: { ids: [...ids] } }, options),
    invalidates: () => [queryKeys.notices],
  });
}
