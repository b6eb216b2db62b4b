import { readPublicRuleCard, readRuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** One version of a rule card; drafts only for their department. */
export function ruleCardQuery(ruleCardId: string, isPublic = false) {
  return queryOptions({
    queryKey: [...queryKeys.ruleCards, ...(isPublic ? ['public'] : []), ruleCardId],
    queryFn: ({ signal }) => call(isPublic ? readPublicRuleCard : readRuleCard, { params: { ruleCardId } }, { signal }),
  });
}
