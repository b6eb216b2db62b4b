import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  listLotVisits,
  listRequests,
  readOffers,
  readVisit,
  requestVisits,
} from '@holdwater/shared-types/visits/visit.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { Offers } from './offers.service.js';
import { ReadVisits } from './read-visits.service.js';
import { RequestVisits } from './request-visits.service.js';

/** Offers, requests, and visits one by one or by lot. */
@Controller()
export class VisitsController {
  constructor(
    private readonly offers: Offers,
    private readonly requests: RequestVisits,
    private readonly visits: ReadVisits,
  ) {}

  @ContractRoute(readOffers, signedIn('visits.requestingSideOf'))
  async readOffers(@Input() { body }: RouteInput<typeof readOffers>, @CurrentActor() actor: Actor) {
    return this.offers.read(actor, body);
  }

  @ContractRoute(requestVisits, signedIn('visits.requestingSideOf'))
  async requestVisits(@Input() { body }: RouteInput<typeof requestVisits>, @CurrentActor() actor: Actor) {
    return this.requests.request(actor, body);
  }

  @ContractRoute(readVisit, signedIn('lots.canReadLot'))
  async readVisit(@Input() { params }: RouteInput<typeof readVisit>, @CurrentActor() actor: Actor) {
    return this.visits.read(actor, params.visitId);
  }

  @ContractRoute(listLotVisits, signedIn('lots.canReadLot'))
  async listLotVisits(@Input() { params }: RouteInput<typeof listLotVisits>, @CurrentActor() actor: Actor) {
    return this.visits.listOfLot(actor, params.lotId);
  }

  @ContractRoute(listRequests, signedIn('visits.canWorkRequests'))
  async listRequests(@Input() { params }: RouteInput<typeof listRequests>, @CurrentActor() actor: Actor) {
    return this.visits.listRequests(actor, params.departmentId);
  }
}
