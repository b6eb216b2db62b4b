import type { RouteAnswer, RouteCall } from '@holdwater/shared-types/common/route.js';
import { recordOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';
import { queryKeys } from '../../../lib/query-keys';

type Body = RouteCall<typeof recordOutcome>['body'];
export type Recorded = RouteAnswer<typeof recordOutcome>;
export type OutcomeToRecord = Omit<Body, 'clientId' | 'madeAt'>;

/** Inspector: closes the visit; answers, work, corrections, acceptances and reopenings in one act. */
export function useRecordOutcome(visitId: string, lotId: string, onDone: (recorded: Recorded) => void) {
  const queryClient = useQueryClient();
  return useFieldMutation({
    mutationFn: (outcome: OutcomeToRecord, { clientId, madeAt }, options) =>
      call(recordOutcome, { params: { visitId }, body: { ...outcome, clientId, madeAt } }, options),
    onDone,
    invalidates: () => [queryKeys.visit(visitId), ...staleOnLot(lotId, ['outcomes', 'holds'])],
    onFail: (error) => {
      if (!isApiError(error) || error.status !== 409) return;
      const stale = [queryKeys.visit(visitId), queryKeys.lotPart(lotId, 'corrections')];
      stale.forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
    },
  });
}
