import { Controller } from '@nestjs/common';
import {
  addReading,
  endHold,
  type Hold,
  listHolds,
  startHold,
  strikeReading,
} from '@holdwater/shared-types/holds/hold.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { HoldEnd } from './hold-end.service.js';
import { HoldsPresenter } from './holds.presenter.js';
import { HoldsQueries } from './holds.queries.js';
import { Readings } from './readings.service.js';
import { StartHold } from './start-hold.service.js';

@Controller()
export class HoldsController {
  constructor(
    private readonly lots: LotsQueries,
    private readonly queries: HoldsQueries,
    private readonly presenter: HoldsPresenter,
    private readonly starting: StartHold,
    private readonly readings: Readings,
    private readonly ending: HoldEnd,
  ) {}

  @ContractRoute(listHolds, signedIn('lots.canReadLot'))
  async list(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof listHolds>): Promise<{ items: Hold[] }> {
    const lot = await this.lots.getLotFor(actor, input.params.lotId);
    return { items: await this.presenter.many(await this.queries.listOfLot(lot.id)) };
  }

  @ContractRoute(startHold, signedIn('holds.canStartHold'))
  start(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof startHold>): Promise<Hold> {
    return this.starting.start(actor, input.params.lotId, input.body);
  }

  @ContractRoute(addReading, signedIn('lots.canAddReading'))
  add(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof addReading>): Promise<Hold> {
    return this.readings.add(actor, input.params.holdId, input.body);
  }

  @ContractRoute(strikeReading, signedIn('holds.canStrikeReading'))
  strike(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof strikeReading>): Promise<Hold> {
    return this.readings.strike(actor, input.params.readingId, input.body.why);
  }

  @ContractRoute(endHold, signedIn('holds.canEndHold'))
  end(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof endHold>): Promise<Hold> {
    return this.ending.endByPlumber(actor, input.params.holdId, input.body);
  }
}
