import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { withdrawVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof withdrawVisit>['body'];

/** Requesting side: takes a visit back; its calendar entry goes. */
export function useWithdrawVisit(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(withdrawVisit, { params: { visitId }, body }, options),
    onDone,
  );
}
