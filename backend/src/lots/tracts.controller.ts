import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { createTract, listTracts, updateTract } from '@holdwater/shared-types/lots/tract.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { TractsQueries } from './tracts.queries.js';
import { TractsService } from './tracts.service.js';

@Controller()
export class TractsController {
  constructor(
    private readonly tracts: TractsService,
    private readonly reading: TractsQueries,
  ) {}

  @ContractRoute(listTracts, signedIn('lots.canReadLot'))
  async list(@CurrentActor() actor: Actor) {
    return { items: await this.reading.listFor(actor) };
  }

  @ContractRoute(createTract, signedIn('tracts.canEditTracts'))
  async create(@Input() { body }: RouteInput<typeof createTract>, @CurrentActor() actor: Actor) {
    return this.tracts.create(actor, body);
  }

  @ContractRoute(updateTract, signedIn('tracts.canEditTracts'))
  async update(@Input() { params, body }: RouteInput<typeof updateTract>, @CurrentActor() actor: Actor) {
    return this.tracts.update(actor, params.tractId, body);
  }
}
