import { readMe, updateMe } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { Controller } from '@nestjs/common';
import { signedIn } from '../../common/access/access.js';
import type { Actor } from '../../common/access/actor.js';
import { CurrentActor } from '../../common/access/current-actor.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { MyAccount } from './me.service.js';

@Controller()
export class MeController {
  constructor(private readonly account: MyAccount) {}

  @ContractRoute(readMe, signedIn('own'))
  read(@CurrentActor() actor: Actor) {
    return this.account.read(actor);
  }

  @ContractRoute(updateMe, signedIn('own'))
  update(@Input() { body }: RouteInput<typeof updateMe>, @CurrentActor() actor: Actor) {
    return this.account.update(actor, body);
  }
}
