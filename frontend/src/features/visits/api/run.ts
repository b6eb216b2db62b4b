import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import { readRun } from '@holdwater/shared-types/visits/calendar.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export type Run = RouteAnswer<typeof readRun>;
export type RunStop = Run['stops'][number];

export interface RunAsked {
  /** Today without one. */
  readonly date?: string;
  readonly inspectorId?: string;
  readonly departmentId?: string;
}

/** An inspector's stops of one day, in order. */
export function runQuery(asked: RunAsked) {
  return queryOptions({
    queryKey: [...queryKeys.run, asked],
    queryFn: ({ signal }) => call(readRun, { query: asked }, { signal }),
  });
}
