import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { freeVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof freeVisit>['body'];

/** Desk: the window cannot be kept. */
export function useFreeVisit(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(freeVisit, { params: { visitId }, body }, options),
    onDone,
  );
}
