import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Hold, addReading } from '@holdwater/shared-types/holds/hold.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { actingRole, readingRole } from '../lots/lots.policy.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { HoldModel } from './hold.model.js';
import { canStrikeReading } from './holds.policy.js';
import { HoldsPresenter } from './holds.presenter.js';
import { ReadingLog } from './reading-log.service.js';
import { ReadingModel } from './reading.model.js';

type Body = RouteInput<typeof addReading>['body'];

/** Readings of a test that stands: added by whoever reads, struck with a reason, never edited. */
@Injectable()
export class Readings {
  constructor(
    @InjectModel(HoldModel) private readonly holds: typeof HoldModel,
    @InjectModel(ReadingModel) private readonly readings: typeof ReadingModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly lots: LotsQueries,
    private readonly log: ReadingLog,
    private readonly ledger: Ledger,
    private readonly changes: Changes,
    private readonly presenter: HoldsPresenter,
  ) {}

  /** @throws not-found, not-allowed, hold-ended, bad-input, reading-out-of-gauge, reading-in-the-future */
  async add(actor: Actor, holdId: string, body: Body): Promise<Hold> {
    return this.unitOfWork.run(async () => {
      const hold = (await this.holds.findByPk(holdId, { lock: true })) ?? refuse('not-found');
      const lot = await this.lots.getLotFor(actor, hold.lotId);
      const role = readingRole(actor, lot) ?? refuse('not-allowed', { who: 'readers' });
      const madeAt = correctedMadeAt(body.madeAt, this.clock.now());
      await this.log.append(hold, { ...body, madeAt }, actor, role);
      return this.presenter.one(hold);
    });
  }

  /** @throws not-found, not-allowed, reading-struck */
  async strike(actor: Actor, readingId: string, why: string): Promise<Hold> {
    return this.unitOfWork.run(async () => {
      const reading = (await this.readings.findByPk(readingId, { lock: true })) ?? refuse('not-found');
      const hold = (await this.holds.findByPk(reading.holdId)) ?? refuse('not-found');
      const lot = await this.lots.getLotFor(actor, hold.lotId);
      const { byPerson, byRole } = reading;
      const facts = { byPerson, byRole, plumberId: hold.plumberId };
      if (!canStrikeReading(actor, lot, facts)) refuse('not-allowed', { who: 'maker-or-crew' });
      if (reading.struckAt !== null) refuse('reading-struck', { why: reading.struckWhy });
      await reading.update({ struckAt: this.clock.now(), struckBy: actor.personId, struckWhy: why });
      const by = { personId: actor.personId, role: actingRole(actor, lot) };
      await this.ledger.appendToLot(hold.lotId, 'reading-struck', { holdId: hold.id, readingId, why }, by);
      this.changes.lot(hold.lotId, 'holds', 'visits');
      return this.presenter.one(hold);
    });
  }
}
