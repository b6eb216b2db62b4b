import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { addReading } from '@holdwater/shared-types/holds/hold.contract.js';
import { ClearancesService } from '../clearances/clearances.service.js';
import type { Actor } from '../common/access/actor.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { Ledger } from '../ledger/ledger.service.js';
import type { LotParties } from '../lots/lots.policy.js';
import type { VisitModel } from '../visits/visit.model.js';
import { HoldEnd } from './hold-end.service.js';
import { HoldModel } from './hold.model.js';
import { HoldsQueries } from './holds.queries.js';
import { ReadingLog } from './reading-log.service.js';

type FreshReading = RouteInput<typeof addReading>['body'];

/** The tests of a lot whose plumber is replaced. Inside the unit of work of the handover, the open visits and the lot locked. */
@Injectable()
export class HandedOverTests {
  constructor(
    @InjectModel(HoldModel) private readonly holds: typeof HoldModel,
    private readonly queries: HoldsQueries,
    private readonly ending: HoldEnd,
    private readonly log: ReadingLog,
    private readonly ledger: Ledger,
    private readonly clearances: ClearancesService,
    private readonly clock: Clock,
  ) {}

  /** Every test that stands on the lot, locked. */
  async lockStanding(lotId: string): Promise<HoldModel[]> {
    return this.holds.findAll({ where: { lotId, state: 'standing' }, order: [['id', 'ASC']], lock: true });
  }

  /** Ends them as handed over; a visit that was ready for them goes back to booked, since who said so is gone. */
  async end(actor: Actor, lot: LotParties, visits: readonly VisitModel[], holds: readonly HoldModel[]): Promise<void> {
    for (const hold of holds) {
      const ending = { reason: 'handed-over' as const, at: this.clock.now(), note: null };
      await this.ending.end(actor, lot, visitOf(visits, hold), hold, ending);
    }
  }

  /**
   * The same test in the new plumber's name, after the one it was, its first reading the fresh one.
   * @throws bad-input, reading-out-of-gauge, reading-in-the-future
   */
  async takeOver(actor: Actor, plumberId: string, ended: HoldModel, fresh: FreshReading, path: string): Promise<void> {
    const { lotId, unitNumber, stageCode, system, method } = ended;
    const ordinal = (await this.queries.lastOrdinal(lotId, unitNumber, stageCode, system)) + 1;
    const madeAt = correctedMadeAt(fresh.madeAt, this.clock.now());
    // whatever the test was set up with stays
    const same = ended.get({ plain: true }) as Record<string, unknown>;
    const hold = await this.holds.create({
      ...same,
      ...{ id: randomUUID(), clientId: randomUUID(), ordinal, plumberId, state: 'standing', supersedesId: ended.id },
      ...{ startedBy: actor.personId, startedAt: madeAt, receivedAt: this.clock.now() },
      ...{ endedBy: null, endedAt: null, endReason: null, endNote: null },
    });
    const payload = { holdId: hold.id, system, ordinal, method, unitNumber };
    await this.ledger.appendToLot(lotId, 'test-started', payload, { personId: actor.personId, role: 'plumber' });
    await this.log.append(hold, { ...fresh, madeAt }, actor, 'plumber', path);
  }

  /** Works the plumbing state out anew wherever one of these tests stood. */
  async recompute(holds: readonly HoldModel[]): Promise<void> {
    for (const { lotId, unitNumber, stageCode } of holds) await this.clearances.recompute(lotId, unitNumber, stageCode);
  }
}

function visitOf(visits: readonly VisitModel[], hold: HoldModel): VisitModel | null {
  const isOf = (visit: VisitModel) => visit.stageCode === hold.stageCode && visit.unitNumbers.includes(hold.unitNumber);
  return visits.find(isOf) ?? null;
}
