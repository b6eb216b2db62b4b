import { Controller } from '@nestjs/common';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  acceptCorrection,
  type Correction,
  fixCorrection,
  listCorrections,
  reopenCorrection,
} from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { Corrections } from './corrections.service.js';

@Controller()
export class CorrectionsController {
  constructor(private readonly corrections: Corrections) {}

  @ContractRoute(listCorrections, signedIn('lots.canReadLot'))
  list(
    @CurrentActor() actor: Actor,
    @Input() input: RouteInput<typeof listCorrections>,
  ): Promise<RouteAnswer<typeof listCorrections>> {
    return this.corrections.list(actor, input.query);
  }

  @ContractRoute(fixCorrection, signedIn('outcomes.canFixCorrection'))
  fix(@CurrentActor() actor: Actor, @Input() { params, body }: RouteInput<typeof fixCorrection>): Promise<Correction> {
    return this.corrections.move(actor, params.correctionId, { move: 'fix', note: body.note }, body);
  }

  @ContractRoute(acceptCorrection, signedIn('outcomes.canDecideCorrection'))
  accept(
    @CurrentActor() actor: Actor,
    @Input() { params, body }: RouteInput<typeof acceptCorrection>,
  ): Promise<Correction> {
    return this.corrections.move(actor, params.correctionId, { move: 'accept' }, body);
  }

  @ContractRoute(reopenCorrection, signedIn('outcomes.canDecideCorrection'))
  reopen(
    @CurrentActor() actor: Actor,
    @Input() { params, body }: RouteInput<typeof reopenCorrection>,
  ): Promise<Correction> {
    return this.corrections.move(actor, params.correctionId, { move: 'reopen', why: body.why }, body);
  }
}
