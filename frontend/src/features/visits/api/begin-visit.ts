import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { beginVisit } from '@holdwater/shared-types/visits/visit.contract.js';
import { call } from '../../../lib/api';
import { useVisitMove, type VisitDone, type VisitMoveInput } from './visit-changed';

type Input = VisitMoveInput & RouteCall<typeof beginVisit>['body'];

/** Inspector: I am here. */
export function useBeginVisit(onDone: VisitDone) {
  return useVisitMove(
    ({ visitId, ...body }: Input, options) => call(beginVisit, { params: { visitId }, body }, options),
    onDone,
  );
}
