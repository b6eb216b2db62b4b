import type { CorrectionState } from '@holdwater/shared-types/outcomes/correction.states.js';
import { listCorrections } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export interface CorrectionsAsked {
  readonly state: CorrectionState;
  readonly organizationId?: string;
}

/** Corrections of the lots of an organization, newest first. */
export function correctionsQuery(asked: CorrectionsAsked) {
  return infiniteQueryOptions({
    queryKey: [...queryKeys.corrections, asked],
    queryFn: ({ pageParam, signal }) =>
      call(listCorrections, { query: { ...asked, cursor: pageParam ?? undefined } }, { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });
}
