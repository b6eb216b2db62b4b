import type { RouteAnswer, RouteCall } from '@holdwater/shared-types/common/route.js';
import { requestVisits } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';
import { staleByVisits } from './visit-changed';

export type VisitsAsked = RouteCall<typeof requestVisits>['body'];

/** One window for several lots: all of them or none. A refusal may mean that the room shown is gone, so it is read anew. */
export function useRequestVisits(onDone: (answer: RouteAnswer<typeof requestVisits>, asked: VisitsAsked) => void) {
  const queryClient = useQueryClient();
  return useIdempotentMutation({
    mutationFn: (body: VisitsAsked, options) => call(requestVisits, { body }, options),
    invalidates: ({ visits }) => staleByVisits(visits),
    onDone,
    onFail: (error) => {
      if (!isApiError(error) || error.status !== 409) return;
      const stale = [queryKeys.offers, queryKeys.calendar, queryKeys.waiting];
      stale.forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
    },
  });
}
