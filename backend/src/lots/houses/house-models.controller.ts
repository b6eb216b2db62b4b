import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
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
import { signedIn } from '../../common/access/access.js';
import type { Actor } from '../../common/access/actor.js';
import { CurrentActor } from '../../common/access/current-actor.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { ApplyHouseModelService } from './apply-house-model.service.js';
import { HouseModelsPresenter } from './house-models.presenter.js';
import { HouseModelsService } from './house-models.service.js';
import { RemoveHouseModelService } from './remove-house-model.service.js';

@Controller()
export class HouseModelsController {
  constructor(
    private readonly presenter: HouseModelsPresenter,
    private readonly models: HouseModelsService,
    private readonly removing: RemoveHouseModelService,
    private readonly applying: ApplyHouseModelService,
  ) {}

  @ContractRoute(listHouseModels, signedIn('houses.canReadHouseModels'))
  async list(@Input() { query }: RouteInput<typeof listHouseModels>, @CurrentActor() actor: Actor) {
    return this.presenter.list(actor, query.builderId);
  }

  @ContractRoute(createHouseModel, signedIn('houses.canWriteHouseModels'))
  async create(@Input() { body }: RouteInput<typeof createHouseModel>, @CurrentActor() actor: Actor) {
    return this.models.create(actor, body);
  }

  @ContractRoute(readHouseModel, signedIn('houses.canReadHouseModels'))
  async read(@Input() { params }: RouteInput<typeof readHouseModel>, @CurrentActor() actor: Actor) {
    return this.presenter.present(actor, params.houseModelId);
  }

  @ContractRoute(renameHouseModel, signedIn('houses.canWriteHouseModels'))
  async rename(@Input() { params, body }: RouteInput<typeof renameHouseModel>, @CurrentActor() actor: Actor) {
    return this.models.rename(actor, params.houseModelId, body.name);
  }

  @ContractRoute(addHouseModelVersion, signedIn('houses.canWriteHouseModels'))
  async addVersion(@Input() { params, body }: RouteInput<typeof addHouseModelVersion>, @CurrentActor() actor: Actor) {
    return this.models.addVersion(actor, params.houseModelId, body);
  }

  @ContractRoute(removeHouseModel, signedIn('houses.canWriteHouseModels'))
  async remove(@Input() { params }: RouteInput<typeof removeHouseModel>, @CurrentActor() actor: Actor) {
    return this.removing.remove(actor, params.houseModelId);
  }

  @ContractRoute(listModelledUnits, signedIn('houses.canReadHouseModels'))
  async listUnits(@Input() { params, query }: RouteInput<typeof listModelledUnits>, @CurrentActor() actor: Actor) {
    return this.presenter.listUnits(actor, params.houseModelId, query.tractId);
  }

  @ContractRoute(applyHouseModel, signedIn('houses.canApplyHouseModels'))
  async apply(@Input() { params, body }: RouteInput<typeof applyHouseModel>, @CurrentActor() actor: Actor) {
    return this.applying.apply(actor, params.houseModelId, body);
  }
}
