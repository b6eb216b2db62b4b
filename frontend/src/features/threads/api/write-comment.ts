import { writeComment } from '@holdwater/shared-types/threads/thread.contract.js';
import { call } from '../../../lib/api';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';

/** Writes to all three parties of a lot. */
export function useWriteComment(lotId: string, onDone: () => void) {
  return useFieldMutation({
    mutationFn: (text: string, { clientId, madeAt }, options) =>
      call(writeComment, { params: { lotId }, body: { text, clientId, madeAt } }, options),
    onDone,
    invalidates: () => staleOnLot(lotId, ['thread']),
  });
}
