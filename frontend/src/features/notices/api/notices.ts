import { listNotices } from '@holdwater/shared-types/notices/notice.contract.js';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The reader's notices, newest first, some at a time. */
export function noticesQuery() {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.notices, 'list'],
    queryFn: ({ pageParam, signal }) => call(listNotices, { query: { limit: 50, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });
}
