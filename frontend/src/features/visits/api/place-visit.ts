import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { placeVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof placeVisit>['body'];

/** Desk: puts a request into a window, with an inspector or the first free one. */
export function usePlaceVisit(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(placeVisit, { params: { visitId }, body }, options),
    onDone,
  );
}
