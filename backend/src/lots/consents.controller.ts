import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { answerConsents, attachParty, listConsents } from '@holdwater/shared-types/lots/lot.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { AnswerConsentsService } from './answer-consents.service.js';
import { AskPartiesService } from './ask-parties.service.js';
import { ConsentsQueries } from './consents.queries.js';

@Controller()
export class ConsentsController {
  constructor(
    private readonly asking: AskPartiesService,
    private readonly answering: AnswerConsentsService,
    private readonly consents: ConsentsQueries,
  ) {}

  @ContractRoute(attachParty, signedIn('lots.canAttachParty'))
  async attach(@Input() { params, body }: RouteInput<typeof attachParty>, @CurrentActor() actor: Actor) {
    return this.asking.attach(actor, params.lotId, body.kind, body.organizationId);
  }

  @ContractRoute(listConsents, signedIn('own'))
  async list(@CurrentActor() actor: Actor) {
    return { items: await this.consents.listOpen(actor) };
  }

  @ContractRoute(answerConsents, signedIn('consents.canAnswerConsent'))
  async answer(@Input() { body }: RouteInput<typeof answerConsents>, @CurrentActor() actor: Actor) {
    return this.answering.answer(actor, body);
  }
}
