import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { importLots } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { signedIn } from '../../common/access/access.js';
import type { Actor } from '../../common/access/actor.js';
import { CurrentActor } from '../../common/access/current-actor.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { ImportLotsService } from './import-lots.service.js';

@Controller()
export class ImportLotsController {
  constructor(private readonly importing: ImportLotsService) {}

  @ContractRoute(importLots, signedIn('lots.canAddLots'))
  async import(@Input() { body }: RouteInput<typeof importLots>, @CurrentActor() actor: Actor) {
    return this.importing.import(actor, body);
  }
}
