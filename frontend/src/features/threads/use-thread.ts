import { useInfiniteQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useLotLive } from '../../lib/realtime';
import { commentsQuery } from './api/comments';
import { threadLedgerQuery } from './api/thread-ledger';
import { threadLines, type ThreadLine } from './thread-lines';

export interface Thread {
  readonly lines: readonly ThreadLine[] | null;
  readonly error: unknown;
  readonly retry: () => void;
  readonly hasEarlier: boolean;
  readonly isFetchingEarlier: boolean;
  readonly showEarlier: () => void;
}

/** The thread of a lot, kept fresh while it is shown. */
export function useThread(lotId: string, zone: string, isWordsOnly: boolean): Thread {
  useLotLive(lotId);
  const comments = useInfiniteQuery(commentsQuery(lotId));
  const ledger = useInfiniteQuery({ ...threadLedgerQuery(lotId), enabled: true });
  const words = comments.data;
  const entries = ledger.data;
  const lines = useMemo(() => {
    if (words === undefined || entries === undefined) return null;
    return threadLines({
      comments: words.pages.flatMap(({ items }) => items),
      hasMoreComments: words.pages.at(-1)?.nextCursor != null,
      entries: entries.pages.flatMap(({ items }) => items),
      hasMoreEntries: entries.pages.at(-1)?.nextCursor != null,
      isWordsOnly,
      zone,
    });
  }, [words, entries, isWordsOnly, zone]);
  return {
    lines,
    error: words === undefined ? comments.error : entries === undefined ? ledger.error : null,
    retry: () => {
      if (comments.isError) void comments.refetch();
      if (ledger.isError) void ledger.refetch();
    },
    hasEarlier: comments.hasNextPage || (!isWordsOnly && ledger.hasNextPage),
    isFetchingEarlier: comments.isFetchingNextPage || ledger.isFetchingNextPage,
    showEarlier: () => {
      if (comments.hasNextPage) void comments.fetchNextPage();
      if (ledger.hasNextPage) void ledger.fetchNextPage();
    },
  };
}
