import type { RouteCall } from '@holdwater/shared-types/common/route.js';
import {
  addHouseModelVersion,
  applyHouseModel,
  createHouseModel,
  listHouseModels,
  listModelledUnits,
  readHouseModel,
  removeHouseModel,
  renameHouseModel,
} from '@holdwater/shared-types/lots/house-model.contract.js';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { useIdempotentMutation } from '../../../lib/idempotent-mutation';
import { queryKeys } from '../../../lib/query-keys';

/** A builder's house models, by name. */
export function houseModelsQuery(builderId: string) {
  return queryOptions({
    queryKey: [...queryKeys.houseModels, { builderId }],
    queryFn: ({ signal }) => call(listHouseModels, { query: { builderId } }, { signal }),
  });
}

/** One model, its versions and the units taken from it. */
export function houseModelQuery(houseModelId: string) {
  return queryOptions({
    queryKey: [...queryKeys.houseModels, houseModelId],
    queryFn: ({ signal }) => call(readHouseModel, { params: { houseModelId } }, { signal }),
  });
}

/** The units of a tract, or of the lots in none, that a model may be given to. */
export function modelledUnitsQuery(houseModelId: string, tractId: string) {
  return queryOptions({
    queryKey: [...queryKeys.houseModels, houseModelId, 'units', tractId],
    queryFn: ({ signal }) => call(listModelledUnits, { params: { houseModelId }, query: { tractId } }, { signal }),
  });
}

export function useCreateHouseModel() {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof createHouseModel>['body'], options) =>
      call(createHouseModel, { body }, options),
    invalidates: () => [queryKeys.houseModels],
  });
}

export function useRenameHouseModel(houseModelId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof renameHouseModel>['body'], options) =>
      call(renameHouseModel, { params: { houseModelId }, body }, options),
    invalidates: (model) => [
      queryKeys.houseModels,
      ...model.units.map(({ lotId }) => queryKeys.lotPart(lotId, 'detail')),
    ],
  });
}

export function useAddHouseModelVersion(houseModelId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof addHouseModelVersion>['body'], options) =>
      call(addHouseModelVersion, { params: { houseModelId }, body }, options),
    invalidates: () => [queryKeys.houseModels],
  });
}

/** The list alone is read anew: the model's own page is left. */
export function useRemoveHouseModel(houseModelId: string, builderId: string) {
  return useIdempotentMutation({
    mutationFn: (_: null, options) => call(removeHouseModel, { params: { houseModelId } }, options),
    invalidates: () => [houseModelsQuery(builderId).queryKey],
  });
}

export function useApplyHouseModel(houseModelId: string) {
  return useIdempotentMutation({
    mutationFn: (body: RouteCall<typeof applyHouseModel>['body'], options) =>
      call(applyHouseModel, { params: { houseModelId }, body }, options),
    invalidates: (_, { units }) => [queryKeys.houseModels, ...units.map(({ lotId }) => queryKeys.lot(lotId))],
  });
}
