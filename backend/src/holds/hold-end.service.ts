import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Hold, endHold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { HoldEndReason } from '@holdwater/shared-types/holds/hold.states.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { ClearancesService } from '../clearances/clearances.service.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { actingRole, type LotParties } from '../lots/lots.policy.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { HoldModel } from './hold.model.js';
import { canEndHold } from './holds.policy.js';
import { HoldsPresenter } from './holds.presenter.js';
import { TestDown } from './test-down.service.js';
import { TestedVisitQueries } from './tested-visit.queries.js';

type Body = RouteInput<typeof endHold>['body'];

export interface Ending {
  readonly reason: HoldEndReason;
  readonly at: Date;
  readonly note: string | null;
}

/** Ends tests; a visit whose test was up goes back to booked. */
@Injectable()
export class HoldEnd {
  constructor(
    @InjectModel(HoldModel) private readonly holds: typeof HoldModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly lots: LotsQueries,
    private readonly tested: TestedVisitQueries,
    private readonly moves: VisitMoves,
    private readonly down: TestDown,
    private readonly ledger: Ledger,
    private readonly clearances: ClearancesService,
    private readonly changes: Changes,
    private readonly presenter: HoldsPresenter,
  ) {}

  /** The plumber ends a test. One already ended by the same person for the same reason is that act again. @throws not-found, not-allowed, hold-ended */
  async endByPlumber(actor: Actor, holdId: string, body: Body): Promise<Hold> {
    return this.unitOfWork.run(async () => {
      const found = (await this.holds.findByPk(holdId)) ?? refuse('not-found');
      const lot = await this.lots.getLotFor(actor, found.lotId);
      if (!canEndHold(actor, lot)) refuse('not-allowed', { who: 'plumber' });
      const open = await this.tested.findOpenVisit(found.lotId, found.unitNumber, found.stageCode);
      const visit = open && (await this.moves.findLocked(open.id));
      const hold = (await this.holds.findByPk(holdId, { lock: true })) ?? refuse('not-found');
      if (hold.state === 'ended') {
        if (hold.endedBy === actor.personId && hold.endReason === body.reason) return this.presenter.one(hold);
        refuse('hold-ended', { endReason: hold.endReason });
      }
      const at = correctedMadeAt(body.madeAt, this.clock.now());
      await this.end(actor, lot, visit, hold, { reason: body.reason, at, note: body.note ?? null });
      await this.clearances.recompute(hold.lotId, hold.unitNumber, hold.stageCode);
      return this.presenter.one(hold);
    });
  }

  /** Ends a locked, standing test inside the act of the caller, who computes the plumbing state afterwards. */
  async end(actor: Actor, lot: LotParties, visit: VisitModel | null, hold: HoldModel, ending: Ending): Promise<void> {
    const { reason, at, note } = ending;
    await hold.update({ state: 'ended', endedAt: at, endReason: reason, endNote: note, endedBy: actor.personId });
    const { id, system, ordinal, lotId } = hold;
    const by = { personId: actor.personId, role: actingRole(actor, lot) };
    await this.ledger.appendToLot(lotId, 'test-ended', { holdId: id, system, ordinal, reason }, by);
    await this.down.afterHoldEnded(actor, lot, visit, hold);
    this.changes.lot(lotId, 'holds', 'visits');
  }
}
