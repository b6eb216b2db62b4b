import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { sayNoLongerUp, sayTestUp, type VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { TestUp } from './test-up.service.js';

@Controller()
export class TestUpController {
  constructor(private readonly testUp: TestUp) {}

  @ContractRoute(sayTestUp, signedIn('holds.canSayTestUp'))
  say(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof sayTestUp>): Promise<VisitSummary> {
    return this.testUp.say(actor, input.params.visitId, input.body);
  }

  @ContractRoute(sayNoLongerUp, signedIn('holds.downMoveOf'))
  sayNoLonger(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof sayNoLongerUp>): Promise<VisitSummary> {
    return this.testUp.sayNoLonger(actor, input.params.visitId, input.body);
  }
}
