import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  createLot,
  listLots,
  readLot,
  searchLots,
  setGeometry,
  updateLot,
} from '@holdwater/shared-types/lots/lot.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { CreateLotService } from './create-lot.service.js';
import { LotDetailPresenter } from './lot-detail.presenter.js';
import { ReadLotsService } from './read-lots.service.js';
import { UpdateLotService } from './update-lot.service.js';

@Controller()
export class LotsController {
  constructor(
    private readonly reading: ReadLotsService,
    private readonly detail: LotDetailPresenter,
    private readonly creating: CreateLotService,
    private readonly updating: UpdateLotService,
  ) {}

  @ContractRoute(listLots, signedIn('lots.canReadLot'))
  async list(@Input() { query }: RouteInput<typeof listLots>, @CurrentActor() actor: Actor) {
    return this.reading.list(actor, query);
  }

  @ContractRoute(searchLots, signedIn('lots.canReadLot'))
  async search(@Input() { query }: RouteInput<typeof searchLots>, @CurrentActor() actor: Actor) {
    return this.reading.search(actor, query.q);
  }

  @ContractRoute(createLot, signedIn('lots.canAddLots'))
  async create(@Input() { body }: RouteInput<typeof createLot>, @CurrentActor() actor: Actor) {
    return this.creating.create(actor, body);
  }

  @ContractRoute(readLot, signedIn('lots.canReadLot'))
  async read(@Input() { params }: RouteInput<typeof readLot>, @CurrentActor() actor: Actor) {
    return this.detail.present(actor, params.lotId);
  }

  @ContractRoute(updateLot, signedIn('lots.canEditLot'))
  async update(@Input() { params, body }: RouteInput<typeof updateLot>, @CurrentActor() actor: Actor) {
    return this.updating.update(actor, params.lotId, body);
  }

  @ContractRoute(setGeometry, signedIn('lots.canEditGeometry'))
  async setGeometry(@Input() { params, body }: RouteInput<typeof setGeometry>, @CurrentActor() actor: Actor) {
    return this.updating.setGeometry(actor, params.lotId, params.unitNumber, body.geometry);
  }
}
