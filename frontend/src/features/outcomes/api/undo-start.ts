import { undoBegin } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitMoveInput } from '../../visits/api/visit-changed';

/** Inspector: takes the start back, within a minute. */
export function useUndoStart() {
  return useVisitMove(
    ({ visitId, expectedVersion }: VisitMoveInput, options) =>
      call(undoBegin, { params: { visitId }, body: { expectedVersion } }, options),
    () => undefined,
  );
}
