import { sayNoLongerUp, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';
import { queryKeys } from '../../../lib/query-keys';

export interface TestDown {
  readonly visitId: string;
  readonly expectedVersion: number;
}

/** Plumber, or the inspector who finds it so: the test is down again. */
export function useNoLongerUp(lotId: string, onDone: () => void) {
  const queryClient = useQueryClient();
  return useFieldMutation<TestDown, VisitSummary>({
    mutationFn: ({ visitId, expectedVersion }, { clientId, madeAt }, options) =>
      call(sayNoLongerUp, { params: { visitId }, body: { expectedVersion, clientId, madeAt } }, options),
    onDone,
    invalidates: ({ id }) => [queryKeys.visit(id), ...staleOnLot(lotId, ['visits'])],
    onFail: (error) => {
      if (!isApiError(error) || error.status !== 409) return;
      staleOnLot(lotId, ['visits']).forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
    },
  });
}
