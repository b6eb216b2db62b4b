import { editRuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** Desk: replaces what a draft says. */
export function useEditRuleCard(ruleCardId: string) {
  return useIdempotentMutation({
    mutationFn: (content: RuleCardContent, options) =>
      call(editRuleCard, { params: { ruleCardId }, body: { content } }, options),
    invalidates: () => [queryKeys.ruleCards],
  });
}
