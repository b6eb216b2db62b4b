import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import {
  declineVisit,
  freeVisit,
  moveVisit,
  placeVisit,
  setNotReached,
  withdrawVisit,
} from '@holdwater/shared-types/visits/visit.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { EndVisit } from './end-visit.service.js';
import { PlaceVisit } from './place-visit.service.js';

const byPolicy = signedIn('visits.mayMove');

/** Moves of the requesting side and the desk. */
@Controller()
export class VisitMovesController {
  constructor(
    private readonly places: PlaceVisit,
    private readonly ends: EndVisit,
  ) {}

  @ContractRoute(placeVisit, byPolicy)
  async place(@Input() { params, body }: RouteInput<typeof placeVisit>, @CurrentActor() actor: Actor) {
    return this.places.place(actor, params.visitId, body);
  }

  @ContractRoute(moveVisit, byPolicy)
  async move(@Input() { params, body }: RouteInput<typeof moveVisit>, @CurrentActor() actor: Actor) {
    return this.places.move(actor, params.visitId, body);
  }

  @ContractRoute(declineVisit, byPolicy)
  async decline(@Input() { params, body }: RouteInput<typeof declineVisit>, @CurrentActor() actor: Actor) {
    return this.ends.decline(actor, params.visitId, body);
  }

  @ContractRoute(withdrawVisit, byPolicy)
  async withdraw(@Input() { params, body }: RouteInput<typeof withdrawVisit>, @CurrentActor() actor: Actor) {
    return this.ends.withdraw(actor, params.visitId, body);
  }

  @ContractRoute(setNotReached, byPolicy)
  async setNotReached(@Input() { params, body }: RouteInput<typeof setNotReached>, @CurrentActor() actor: Actor) {
    return this.ends.setNotReached(actor, params.visitId, body);
  }

  @ContractRoute(freeVisit, byPolicy)
  async free(@Input() { params, body }: RouteInput<typeof freeVisit>, @CurrentActor() actor: Actor) {
    return this.ends.free(actor, params.visitId, body);
  }
}
