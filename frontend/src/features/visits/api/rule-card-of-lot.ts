import { readRuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** The rule card of a lot: when the tests must be up. */
export function ruleCardOfLotQuery(ruleCardId: string) {
  return queryOptions({
    queryKey: [...queryKeys.ruleCards, ruleCardId],
    queryFn: ({ signal }) => call(readRuleCard, { params: { ruleCardId } }, { signal }),
  });
}
