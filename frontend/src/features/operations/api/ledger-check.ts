import { verifyLedger } from '@holdwater/shared-types/operations/operations.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Recomputes every chain; it is work, so only when asked. */
export const ledgerCheckQuery = queryOptions({
  queryKey: queryKeys.ledgerCheck,
  queryFn: ({ signal }) => call(verifyLedger, {}, { signal }),
  staleTime: Infinity,
});
