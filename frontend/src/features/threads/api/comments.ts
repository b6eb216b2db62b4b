import { listComments } from '@holdwater/shared-types/threads/thread.contract.js';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The words of a lot's thread, newest first, some at a time. */
export function commentsQuery(lotId: string) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'thread'), 'comments'],
    queryFn: ({ pageParam, signal }) =>
      call(listComments, { params: { lotId }, query: { limit: 50, cursor: pageParam } }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });
}
