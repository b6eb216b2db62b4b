import { deleteRuleCardDraft } from '@holdwater/shared-types/departments/departments.contract.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Desk: throws a draft away. */
export function useDeleteRuleCardDraft(ruleCardId: string) {
  return useIdempotentMutation({
    mutationFn: (_: void, options) => call(deleteRuleCardDraft, { params: { ruleCardId } }, options),
    invalidates: () => [queryKeys.departments],
  });
}
