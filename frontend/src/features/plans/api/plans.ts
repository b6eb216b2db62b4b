import { listPlanHistory, listPlans } from '@holdwater/shared-types/plans/plan.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';
import type { PlannedPart } from './plan-offers';

/** The current plan of every unit, stage and system of a lot. */
export function lotPlansQuery(lotId: string) {
  return queryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'plans'), 'current'],
    queryFn: ({ signal }) => call(listPlans, { params: { lotId } }, { signal }),
  });
}

/** Every plan of one part, the newest first. */
export function planHistoryQuery(lotId: string, part: PlannedPart) {
  return queryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'plans'), 'history', part],
    queryFn: ({ signal }) => call(listPlanHistory, { params: { lotId }, query: { ...part } }, { signal }),
  });
}
