import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import { readDayBoard } from '@holdwater/shared-types/visits/calendar.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export type DayBoard = RouteAnswer<typeof readDayBoard>;

/** Desk: a day of the department, every inspector's visits and the requests that want it. */
export function dayBoardQuery(departmentId: string, date: string) {
  return queryOptions({
    queryKey: [...queryKeys.dayBoard, departmentId, date],
    queryFn: ({ signal }) => call(readDayBoard, { params: { departmentId }, query: { date } }, { signal }),
  });
}
