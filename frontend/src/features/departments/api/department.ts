import { readDepartment } from '@holdwater/shared-types/departments/departments.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

/** A department with every version of its rule card, its closures and what the reader may do there. */
export function departmentQuery(departmentId: string) {
  return queryOptions({
    queryKey: [...queryKeys.departments, 'one', departmentId],
    queryFn: ({ signal }) => call(readDepartment, { params: { departmentId } }, { signal }),
  });
}
