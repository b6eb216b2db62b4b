import { fixCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { call } from '../../../lib/api';
import { useCorrectionMove, type CorrectionDone, type CorrectionMoveInput } from './correction-changed';

type Input = CorrectionMoveInput & { readonly note: string };

/** Plumber: fixed, with what was done. */
export function useFixCorrection(onDone: CorrectionDone) {
  return useCorrectionMove(
    ({ correctionId, ...fix }: Input, { clientId, madeAt }, options) =>
      call(fixCorrection, { params: { correctionId }, body: { ...fix, clientId, madeAt } }, options),
    onDone,
  );
}
