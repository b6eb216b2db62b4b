import { sayTestUp, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';
import { queryKeys } from '../../../lib/query-keys';
import type { TypedReading } from '../typed-reading';

export interface TestUp {
  readonly visitId: string;
  readonly expectedVersion: number;
  /** Read in the same act. */
  readonly reading?: { readonly holdId: string; readonly reading: TypedReading };
}

/** Plumber: the tests are standing for the booked window. A conflict shows how the visit stands now. */
export function useSayTestUp(lotId: string) {
  const queryClient = useQueryClient();
  return useFieldMutation<TestUp, VisitSummary>({
    mutationFn: ({ visitId, expectedVersion, reading }, { clientId, madeAt, idOf }, options) => {
      const readings = reading
        ? [{ holdId: reading.holdId, ...reading.reading, clientId: idOf('reading'), madeAt }]
        : undefined;
      return call(sayTestUp, { params: { visitId }, body: { expectedVersion, clientId, madeAt, readings } }, options);
    },
    invalidates: ({ id }) => [queryKeys.visit(id), ...staleOnLot(lotId, ['holds', 'visits'])],
    onFail: (error) => {
      if (!isApiError(error) || error.status !== 409) return;
      staleOnLot(lotId, ['holds', 'visits']).forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
    },
  });
}
