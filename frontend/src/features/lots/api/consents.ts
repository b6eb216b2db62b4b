import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { answerConsents, listConsents } from '@holdwater/shared-types/lots/lot.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Lots that ask an organization of the reader to join. */
export function consentsQuery() {
  return queryOptions({
    queryKey: queryKeys.consents,
    queryFn: ({ signal }) => call(listConsents, {}, { signal }),
  });
}

/** Joins lots or refuses to, several at once. */
export function useAnswerConsents() {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof answerConsents>['body'], options) => call(answerConsents, { body }, options),
    invalidates: (_, { lotIds }) => [
      queryKeys.consents,
      queryKeys.lots,
      queryKeys.tracts,
      queryKeys.waiting,
      queryKeys.search,
      ...lotIds.map(queryKeys.lot),
    ],
  });
}
