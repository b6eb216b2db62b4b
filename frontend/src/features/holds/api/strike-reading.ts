import { strikeReading, type Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { isApiError } from '../../../lib/api-error';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { staleOnLot } from '../../../lib/live-topics';

export interface Strike {
  readonly readingId: string;
  readonly why: string;
}

/** Strikes a reading: it stays in the log with the reason and counts for nothing. Where somebody was faster, the log is read anew. */
export function useStrikeReading(lotId: string, onDone: () => void) {
  const queryClient = useQueryClient();
  return useIdempotentMutation<Strike, Hold>({
    mutationFn: ({ readingId, why }, options) => call(strikeReading, { params: { readingId }, body: { why } }, options),
    invalidates: () => staleOnLot(lotId, ['holds', 'visits']),
    onDone,
    onFail: (error) => {
      if (!isApiError(error) || error.status !== 409) return;
      staleOnLot(lotId, ['holds']).forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
    },
  });
}
