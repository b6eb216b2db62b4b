import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { choosePlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { call } from '../../../lib/api';
import { useFieldMutation } from '../../../lib/field-mutation';
import { staleOnLot } from '../../../lib/live-topics';

export type NewPlan = Omit<RouteCall<typeof choosePlan>['body'], 'clientId' | 'madeAt'>;

/** Plumber: chooses how a system is put under test. */
export function useChoosePlan(lotId: string) {
  return useFieldMutation({
    mutationFn: (plan: NewPlan, { clientId, madeAt }, options) =>
      call(choosePlan, { params: { lotId }, body: { ...plan, clientId, madeAt } }, options),
    invalidates: () => staleOnLot(lotId, ['plans']),
  });
}
