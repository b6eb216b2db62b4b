import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQueryClient, type QueryKey } from '@tanstack/react-query';
import type { CallOptions } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { staleForPerson, staleOnLot } from '../../../lib/live-topics';
import { queryKeys } from '../../../lib/query-keys';

/** Everything that shows these visits: theirs, their lots' and every board. */
export function staleByVisits(visits: readonly Pick<VisitSummary, 'id' | 'lotId'>[]): QueryKey[] {
  return visits.flatMap((visit) => [queryKeys.visit(visit.id), ...staleOnLot(visit.lotId, ['visits'])]);
}

export interface VisitMoveInput {
  readonly visitId: string;
  readonly expectedVersion: number;
}

/** Called once the move is done and before what shows it is read anew: what showed the act may then be gone. */
export type VisitDone = (visit: VisitSummary) => void;

/**
 * A move of one visit. A conflict means that it stands otherwise than shown, so all that shows it is read anew before the reader decides
 * again.
 */
export function useVisitMove<Input extends VisitMoveInput>(
  send: (input: Input, options: CallOptions) => Promise<VisitSummary>,
  onDone: VisitDone,
) {
  const queryClient = useQueryClient();
  return useIdempotentMutation<Input, VisitSummary>({
    mutationFn: send,
    invalidates: (visit) => staleByVisits([visit]),
    onDone,
    onFail: (error, { visitId }) => {
      if (!isApiError(error) || error.status !== 409) return;
      const stale = [queryKeys.visit(visitId), ...staleForPerson('waiting')];
      stale.forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
    },
  });
}
