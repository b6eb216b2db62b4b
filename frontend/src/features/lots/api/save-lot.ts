import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import { attachParty, createLot, setGeometry, updateLot } from '@holdwater/shared-types/lots/lot.contract.js';
import type { HouseGeometryGiven } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

const staleByLot = (lotId: string) => [
  queryKeys.lot(lotId),
  queryKeys.lots,
  queryKeys.tracts,
  queryKeys.search,
  queryKeys.waiting,
];

/** Builder: adds a lot. */
export function useCreateLot() {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof createLot>['body'], options) => call(createLot, { body }, options),
    invalidates: (lot) => staleByLot(lot.id),
  });
}

/** Changes a lot; the desk may set the permit only. */
export function useUpdateLot(lotId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof updateLot>['body'], options) =>
      call(updateLot, { params: { lotId }, body }, options),
    invalidates: () => staleByLot(lotId),
  });
}

/** Builder or plumber: the house of one unit as it will be tested. */
export function useSetGeometry(lotId: string, unitNumber: number) {
  return useIdempotentMutation({
    mutationFn: (geometry: HouseGeometryGiven, options) =>
      call(setGeometry, { params: { lotId, unitNumber }, body: { geometry } }, options),
    invalidates: () => [queryKeys.lot(lotId), queryKeys.houseModels],
  });
}

/** Builder: asks a plumber or a department to join. */
export function useAttachParty(lotId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof attachParty>['body'], options) =>
      call(attachParty, { params: { lotId }, body }, options),
    invalidates: () => staleByLot(lotId),
  });
}
