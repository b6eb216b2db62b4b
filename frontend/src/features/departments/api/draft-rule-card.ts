import { draftRuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Desk: a draft that begins as the newest version stands. */
export function useDraftRuleCard(departmentId: string) {
  return useIdempotentMutation({
    mutationFn: (_: void, options) => call(draftRuleCard, { params: { departmentId }, body: {} }, options),
    invalidates: () => [queryKeys.departments],
  });
}
