import { beginVisit, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useFieldMutation } from '../../../lib/field-mutation';
import { queryKeys } from '../../../lib/query-keys';
import { staleByVisits, type VisitMoveInput } from '../../visits/api/visit-changed';

type Input = VisitMoveInput & { readonly isTakingOver?: boolean };

/** Inspector: I am here; another's visit only knowingly. */
export function useStartVisit() {
  const queryClient = useQueryClient();
  return useFieldMutation<Input, VisitSummary>({
    mutationFn: ({ visitId, ...start }, { clientId, madeAt }, options) =>
      call(beginVisit, { params: { visitId }, body: { ...start, clientId, madeAt } }, options),
    invalidates: (visit) => staleByVisits([visit]),
    onFail: (error, { visitId }) => {
      if (!isApiError(error) || error.status !== 409) return;
      void queryClient.invalidateQueries({ queryKey: queryKeys.visit(visitId) });
    },
  });
}
