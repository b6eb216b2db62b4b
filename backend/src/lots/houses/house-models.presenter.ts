import { Injectable } from '@nestjs/common';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import {
  mostUnitsListed,
  type HouseModelBrief,
  type HouseModelDetail,
  type listHouseModels,
  type listModelledUnits,
} from '@holdwater/shared-types/lots/house-model.contract.js';
import type { Actor } from '../../common/access/actor.js';
import { refuse } from '../../common/errors/app-error.js';
import { canApplyHouseModels, canReadHouseModels, canWriteHouseModels } from './house-models.policy.js';
import { HouseModelsQueries, type HouseModelRecord, type HouseModelUse } from './house-models.queries.js';
import { modelledUnitOf } from './modelled-units.js';
import { UnitHousesQueries } from './unit-houses.queries.js';

/** Presents house models to their builder's people. */
@Injectable()
export class HouseModelsPresenter {
  constructor(
    private readonly models: HouseModelsQueries,
    private readonly units: UnitHousesQueries,
  ) {}

  /** Throws `not-found` for a builder that is not the actor's. */
  async list(actor: Actor, builderId: string): Promise<RouteAnswer<typeof listHouseModels>> {
    if (!canReadHouseModels(actor, builderId)) refuse('not-found');
    const models = await this.models.listOf(builderId);
    const useOf = await this.models.countUse(models.map(({ id }) => id));
    return {
      items: models.map((model) => briefOf(model, useOf(model.id))),
      canWrite: canWriteHouseModels(actor, builderId),
    };
  }

  /** Throws `not-found`. */
  async present(actor: Actor, modelId: string): Promise<HouseModelDetail> {
    const model = await this.models.getFor(actor, modelId);
    const units = await this.units.listOfModel(modelId);
    const versions = await this.models.listVersions(modelId);
    const useOf = await this.models.countUse([modelId]);
    return {
      ...briefOf(model, useOf(modelId)),
      versions: versions.map(({ madeAt, ...version }) => ({ ...version, madeAt: madeAt.toISOString() })),
      units: units.slice(0, mostUnitsListed).map((unit) => modelledUnitOf(unit, model)),
      areUnitsCut: units.length > mostUnitsListed,
      abilities: {
        canWrite: canWriteHouseModels(actor, model.builderId),
        canApply: canApplyHouseModels(actor, model.builderId),
      },
    };
  }

  /** The units a model may be given to, of one tract or of the lots in none. Throws `not-found`. */
  async listUnits(actor: Actor, modelId: string, tractId: string): Promise<RouteAnswer<typeof listModelledUnits>> {
    const model = await this.models.getFor(actor, modelId);
    const found = await this.units.listOfTract(model.builderId, tractId === 'none' ? null : tractId);
    return {
      items: found.slice(0, mostUnitsListed).map((unit) => modelledUnitOf(unit, model)),
      isCut: found.length > mostUnitsListed,
    };
  }
}

function briefOf(model: HouseModelRecord, use: HouseModelUse): HouseModelBrief {
  const { id, builderId, name, version, geometry, madeAt, madeByName } = model;
  return { id, builderId, name, version, geometry, madeByName, madeAt: madeAt.toISOString(), use };
}
