import { listLots, type LotSummary } from '@holdwater/shared-types/lots/lot.contract.js';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export interface LotScope {
  readonly organizationId: string | undefined;
  readonly tractId: string | undefined;
}

export interface ScopedLots {
  readonly lots: readonly LotSummary[];
  /** Not all of them: there are more than a page of this kind can show. */
  readonly isCut: boolean;
}

const pageSize = 200;
const mostPages = 10;

/** Every lot of a tract, or of an organization: a plat with lots missing would be wrong. */
export function lotsQuery(scope: LotScope) {
  return queryOptions({
    queryKey: [...queryKeys.lots, scope],
    queryFn: ({ signal }) => readAll(scope, signal),
    placeholderData: keepPreviousData,
  });
}

async function readAll(scope: LotScope, signal: AbortSignal): Promise<ScopedLots> {
  const lots: LotSummary[] = [];
  let cursor: string | undefined;
  for (let page = 0; page < mostPages; page += 1) {
    const { items, nextCursor } = await call(listLots, { query: { ...scope, cursor, limit: pageSize } }, { signal });
    lots.push(...items);
    if (nextCursor === null) return { lots, isCut: false };
    cursor = nextCursor;
  }
  return { lots, isCut: true };
}
