import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Actor } from '../common/access/actor.js';
import { Clock } from '../common/time/clock.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { Ledger } from '../ledger/ledger.service.js';
import { actingRole, type LotParties } from '../lots/lots.policy.js';
import { Outbox } from '../notices/outbox.service.js';
import { VisitEvents } from '../visits/visit-events.service.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import type { HoldModel } from './hold.model.js';
import { getStage } from './test-rule.rules.js';
import { TestUpModel } from './test-up.model.js';

export interface DownMove {
  readonly move: 'no-longer-up' | 'find-not-up';
  /** Null where the test itself ended under the visit. */
  readonly expectedVersion: number | null;
  readonly at: Date;
  readonly note: string | null;
}

/** Takes a statement that the tests are up back again; inside the unit of work of the act, the visit locked. */
@Injectable()
export class TestDown {
  constructor(
    @InjectModel(TestUpModel) private readonly testUps: typeof TestUpModel,
    private readonly moves: VisitMoves,
    private readonly events: VisitEvents,
    private readonly ruleCards: RuleCardsQueries,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly clock: Clock,
  ) {}

  /** @throws stale-state */
  async take(actor: Actor, lot: LotParties, visit: VisitModel, down: DownMove): Promise<void> {
    await this.moves.apply(visit, down.move, { expectedVersion: down.expectedVersion, changes: { readyAt: null } });
    await this.testUps.update(
      { endedAt: down.at, endedBy: actor.personId, endNote: down.note },
      { where: { visitId: visit.id, endedAt: null } },
    );
    const by = { personId: actor.personId, role: actingRole(actor, lot) };
    await this.ledger.appendToLot(visit.lotId, 'no-longer-up', { visitId: visit.id }, by);
    const subject = { lotId: visit.lotId, visitId: visit.id, actorId: actor.personId };
    await this.outbox.add('no-longer-up', subject, { visit: await this.events.factsOf(visit) });
  }

  /** A required test that ends takes a ready visit back to booked; whoever ends it is the plumber. */
  async afterHoldEnded(actor: Actor, lot: LotParties, visit: VisitModel | null, hold: HoldModel): Promise<void> {
    if (visit === null || visit.state !== 'ready') return;
    const { content } = await this.ruleCards.getRuleCard(visit.ruleCardId);
    if (!getStage(content, visit.stageCode).systems.includes(hold.system)) return;
    const note = hold.endReason;
    await this.take(actor, lot, visit, { move: 'no-longer-up', expectedVersion: null, at: this.clock.now(), note });
  }
}
