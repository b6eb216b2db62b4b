import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useQueryClient } from '@tanstack/react-query';
import { isApiError } from '../../../lib/api-error';
import { useFieldMutation, type FieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';
import { queryKeys } from '../../../lib/query-keys';

export interface CorrectionMoveInput {
  readonly correctionId: string;
  readonly expectedVersion: number;
}

/** Called once the move is done and before what shows it is read anew: what showed the act may then be gone. */
export type CorrectionDone = (correction: Correction) => void;

/** A move of one correction. After a conflict all that shows it is read anew before the reader decides again. */
export function useCorrectionMove<Input extends CorrectionMoveInput>(
  send: FieldMutation<Input, Correction>['mutationFn'],
  onDone: CorrectionDone,
) {
  const queryClient = useQueryClient();
  return useFieldMutation<Input, Correction>({
    mutationFn: send,
    onDone,
    invalidates: ({ lotId }) => staleOnLot(lotId, ['outcomes']),
    onFail: (error) => {
      if (isApiError(error) && error.status === 409) {
        void queryClient.invalidateQueries({ queryKey: queryKeys.corrections });
      }
    },
  });
}
