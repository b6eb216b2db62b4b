import { readRuleCardTouches } from '@holdwater/shared-types/departments/departments.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** What a version will touch once it is in force; for its department alone. */
export function ruleCardTouchesQuery(ruleCardId: string) {
  return queryOptions({
    queryKey: [...queryKeys.ruleCards, ruleCardId, 'touches'],
    queryFn: ({ signal }) => call(readRuleCardTouches, { params: { ruleCardId } }, { signal }),
  });
}
