import { reopenCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { call } from '../../../lib/api';
import { useCorrectionMove, type CorrectionDone, type CorrectionMoveInput } from './correction-changed';

type Input = CorrectionMoveInput & { readonly why: string };

/** Inspector of that department: not fixed, with the reason. */
export function useReopenCorrection(onDone: CorrectionDone) {
  return useCorrectionMove(
    ({ correctionId, ...reopening }: Input, { clientId, madeAt }, options) =>
      call(reopenCorrection, { params: { correctionId }, body: { ...reopening, clientId, madeAt } }, options),
    onDone,
  );
}
