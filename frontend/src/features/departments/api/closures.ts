import { addClosure, removeClosure } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** A closure changes which windows there are, and frees the visits inside it. */
const stale = () => [queryKeys.departments, queryKeys.calendar, queryKeys.offers, queryKeys.dayBoard, queryKeys.visits];

/** Desk: closes a day or a span of it. */
export function useAddClosure(departmentId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof addClosure>['body'], options) =>
      call(addClosure, { params: { departmentId }, body }, options),
    invalidates: stale,
  });
}

/** Desk: takes a closure back. */
export function useRemoveClosure(departmentId: string) {
  return useIdempotentMutation({
    mutationFn: (closureId: string, options) => call(removeClosure, { params: { departmentId, closureId } }, options),
    invalidates: stale,
  });
}
