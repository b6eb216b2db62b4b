import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { declineVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof declineVisit>['body'];

/** Desk: declines a request, with the reason. */
export function useDeclineVisit(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(declineVisit, { params: { visitId }, body }, options),
    onDone,
  );
}
