import { listDepartments, listPublicRuleCards } from '@holdwater/shared-types/departments/departments.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** Every department with the rule card in force; for those not signed in, only those that have one. */
export function departmentsQuery(isPublic: boolean) {
  return queryOptions({
    queryKey: [...queryKeys.departments, isPublic ? 'public' : 'all'],
    queryFn: ({ signal }) => call(isPublic ? listPublicRuleCards : listDepartments, {}, { signal }),
  });
}
