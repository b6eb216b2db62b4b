import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  answerHandover,
  askHandover,
  listPastLots,
  readPastLot,
  readPastLotLedger,
  withdrawHandover,
} from '@holdwater/shared-types/lots/handover.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { AnswerHandover } from './answer-handover.service.js';
import { AskHandover } from './ask-handover.service.js';
import { PastLots } from './past-lots.service.js';

@Controller()
export class HandoversController {
  constructor(
    private readonly asking: AskHandover,
    private readonly answering: AnswerHandover,
    private readonly past: PastLots,
  ) {}

  @ContractRoute(askHandover, signedIn('lots.canAttachParty'))
  ask(@Input() { params, body }: RouteInput<typeof askHandover>, @CurrentActor() actor: Actor) {
    return this.asking.ask(actor, params.lotId, body.kind, body.organizationId);
  }

  @ContractRoute(withdrawHandover, signedIn('lots.canAttachParty'))
  withdraw(@Input() { params }: RouteInput<typeof withdrawHandover>, @CurrentActor() actor: Actor) {
    return this.asking.withdraw(actor, params.lotId, params.kind);
  }

  @ContractRoute(answerHandover, signedIn('consents.canAnswerConsent'))
  answer(@Input() { params, body }: RouteInput<typeof answerHandover>, @CurrentActor() actor: Actor) {
    return this.answering.answer(actor, params.lotId, body);
  }

  @ContractRoute(listPastLots, signedIn('own'))
  list(@CurrentActor() actor: Actor) {
    return this.past.list(actor);
  }

  @ContractRoute(readPastLot, signedIn('own'))
  read(@Input() { params }: RouteInput<typeof readPastLot>, @CurrentActor() actor: Actor) {
    return this.past.read(actor, params.lotId);
  }

  @ContractRoute(readPastLotLedger, signedIn('own'))
  readLedger(@Input() { params, query }: RouteInput<typeof readPastLotLedger>, @CurrentActor() actor: Actor) {
    return this.past.readLedger(actor, params.lotId, query);
  }
}
