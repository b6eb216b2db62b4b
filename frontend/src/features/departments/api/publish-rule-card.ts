import { publishRuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Desk: puts a draft in force from a day on; it ends the version before. */
export function usePublishRuleCard(ruleCardId: string) {
  return useIdempotentMutation({
    mutationFn: (effectiveFrom: string, options) =>
      call(publishRuleCard, { params: { ruleCardId }, body: { effectiveFrom } }, options),
    invalidates: () => [queryKeys.ruleCards, queryKeys.departments, queryKeys.calendar, queryKeys.offers],
  });
}
