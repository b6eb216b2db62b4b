import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { moveVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof moveVisit>['body'];

/** Another window for the same visit; its calendar entry stays the same one. */
export function useMoveVisit(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(moveVisit, { params: { visitId }, body }, options),
    onDone,
  );
}
