import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { setNotReached } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof setNotReached>['body'];

/** Desk: the inspector did not get there; it keeps first place and costs nothing. */
export function useNotReached(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(setNotReached, { params: { visitId }, body }, options),
    onDone,
  );
}
