import { acceptCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { call } from '../../../lib/api';
import { useCorrectionMove, type CorrectionDone, type CorrectionMoveInput } from './correction-changed';

/** Inspector of that department: accepts the fix. */
export function useAcceptCorrection(onDone: CorrectionDone) {
  return useCorrectionMove(
    ({ correctionId, expectedVersion }: CorrectionMoveInput, { clientId, madeAt }, options) =>
      call(acceptCorrection, { params: { correctionId }, body: { expectedVersion, clientId, madeAt } }, options),
    onDone,
  );
}
