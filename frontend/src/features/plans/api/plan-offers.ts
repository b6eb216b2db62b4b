import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { PlanToolsGiven } from '@holdwater/shared-types/plans/plan-tools.js';
import { readPlanOffers } from '@holdwater/shared-types/plans/plan.contract.js';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The part of a lot that is planned for. */
export interface PlannedPart {
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly system: System;
}

/** The ways to test a part, each worked out with these tools. While others are typed, the ways of before stay. */
export function planOffersQuery(lotId: string, part: PlannedPart, tools: PlanToolsGiven) {
  return queryOptions({
    queryKey: [...queryKeys.lotPart(lotId, 'plans'), 'offers', part, tools],
    queryFn: ({ signal }) => call(readPlanOffers, { params: { lotId }, body: { ...part, tools } }, { signal }),
    placeholderData: keepPreviousData,
  });
}
