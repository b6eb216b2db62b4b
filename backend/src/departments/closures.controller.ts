import { Controller } from '@nestjs/common';
import { addClosure, removeClosure } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { ClosuresService } from './closures.service.js';

@Controller()
export class ClosuresController {
  constructor(private readonly closures: ClosuresService) {}

  @ContractRoute(addClosure, signedIn('departments.canClose'))
  async add(@Input() { params, body }: RouteInput<typeof addClosure>, @CurrentActor() actor: Actor) {
    return this.closures.add(actor, params.departmentId, body);
  }

  @ContractRoute(removeClosure, signedIn('departments.canClose'))
  async remove(@Input() { params }: RouteInput<typeof removeClosure>, @CurrentActor() actor: Actor) {
    return this.closures.remove(actor, params.departmentId, params.closureId);
  }
}
