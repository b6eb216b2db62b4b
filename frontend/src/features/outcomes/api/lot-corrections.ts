import { listCorrections } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** A lot has few corrections: one page holds them. */
const mostOfLot = 200;

/** Every correction of a lot, in the order they were counted. */
export function lotCorrectionsQuery(lotId: string) {
  return queryOptions({
    queryKey: queryKeys.lotPart(lotId, 'corrections'),
    queryFn: async ({ signal }) => {
      const { items } = await call(listCorrections, { query: { lotId, limit: mostOfLot } }, { signal });
      return [...items].sort((a, b) => a.number - b.number);
    },
  });
}
