import type { RouteAnswer, RouteCall } from '@holdwater/shared-types/common/route.js';
import { readOffers } from '@holdwater/shared-types/visits/visit.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { queryKeys } from '../../../lib/query-keys';

export type OffersAsked = RouteCall<typeof readOffers>['body'];
export type Offers = RouteAnswer<typeof readOffers>;

/** The windows for these lots and this stage, with room and reasons. Books nothing; room goes fast, so it is read anew when looked at again. */
export function offersQuery(asked: OffersAsked) {
  return queryOptions({
    queryKey: [...queryKeys.offers, asked],
    queryFn: ({ signal }) => call(readOffers, { body: asked }, { signal }),
    staleTime: 5_000,
  });
}
