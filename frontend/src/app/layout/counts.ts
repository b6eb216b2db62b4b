import { listNotices } from '@holdwater/shared-types/notices/notice.contract.js';
import { readWaiting, type WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import { queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '../../lib/api';
import { queryKeys } from '../../lib/query-keys';
import { useSession } from '../../lib/session-context';
import type { SheetId } from '../sheets';

/** What waits on the reader and on others, in the chosen organization. */
export function waitingQuery(organizationId: string | undefined) {
  return queryOptions({
    queryKey: [...queryKeys.waiting, { organizationId }],
    queryFn: ({ signal }) => call(readWaiting, { query: { organizationId } }, { signal }),
  });
}

const unreadQuery = queryOptions({
  queryKey: [...queryKeys.notices, 'unread'],
  queryFn: async ({ signal }) => (await call(listNotices, { query: { limit: 1 } }, { signal })).unread,
});

/** How many notices are unread; 0 while not known. */
export function useUnreadNotices(): number {
  return useQuery(unreadQuery).data ?? 0;
}

/** Everything that waits; empty while not known. */
export function useWaiting(): readonly WaitingItem[] {
  const { chosen } = useSession();
  const waiting = useQuery({ ...waitingQuery(chosen?.organization.id), enabled: chosen !== null });
  return waiting.data?.items ?? [];
}

/** Which sheet a kind of waiting is done on. */
const sheetOfKind: Partial<Record<WaitingItem['kind'], SheetId>> = {
  'correction-to-fix': 'corrections',
  'request-to-place': 'requests',
};

/** Counts beside the sheets' words: only what waits on the reader. */
export function useSheetCounts(): Partial<Record<SheetId, number>> {
  return countBySheet(useWaiting());
}

export function countBySheet(waiting: readonly WaitingItem[]): Partial<Record<SheetId, number>> {
  const counts: Partial<Record<SheetId, number>> = {};
  for (const item of waiting) {
    const sheet = sheetOfKind[item.kind];
    if (sheet !== undefined && item.isOnYou) counts[sheet] = (counts[sheet] ?? 0) + item.count;
  }
  return counts;
}
