import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Actor } from '../common/access/actor.js';
import { AppError, refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { currentRequest, requestContext } from '../common/request/request-context.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { readingRole } from '../lots/lots.policy.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { HoldModel } from './hold.model.js';
import { ReadingLog } from './reading-log.service.js';
import type { UpBody } from './test-up-statements.service.js';

type UpReading = NonNullable<UpBody['readings']>[number];

/** Readings of an act that came too late for anything else: what was read was read. */
@Injectable()
export class KeptReadings {
  constructor(
    @InjectModel(HoldModel) private readonly holds: typeof HoldModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly moves: VisitMoves,
    private readonly log: ReadingLog,
    private readonly clock: Clock,
  ) {}

  /**
   * Adds the readings to the tests of a visit's lot, standing or ended since, and gives how many of them are in the log; one that fits no
   * test there is left out. Commits by itself, and stores no answer: the act they came with is still to be answered.
   * @throws not-found, not-allowed
   */
  async keep(actor: Actor, visitId: string, readings: readonly UpReading[]): Promise<number> {
    if (readings.length === 0) return 0;
    const work = () => this.unitOfWork.run(() => this.addAll(actor, visitId, readings));
    const request = currentRequest();
    return request === null ? work() : requestContext.run({ ...request, idempotency: null }, work);
  }

  private async addAll(actor: Actor, visitId: string, readings: readonly UpReading[]): Promise<number> {
    const { visit, lot } = await this.moves.lockVisit(actor, visitId);
    const role = readingRole(actor, lot) ?? refuse('not-allowed', { who: 'readers' });
    let kept = 0;
    for (const reading of readings) {
      const hold = await this.findHold(visit, reading.holdId);
      if (hold !== null && (await this.isAdded(hold, reading, actor, role))) kept += 1;
    }
    return kept;
  }

  private findHold({ lotId, stageCode, unitNumbers }: VisitModel, id: string): Promise<HoldModel | null> {
    return this.holds.findOne({ where: { id, lotId, stageCode, unitNumber: [...unitNumbers] }, lock: true });
  }

  /** A refusal comes before anything of the reading is written, so the others stand. */
  private async isAdded(
    hold: HoldModel,
    { holdId: _holdId, madeAt, ...typed }: UpReading,
    actor: Actor,
    role: NonNullable<ReturnType<typeof readingRole>>,
  ): Promise<boolean> {
    try {
      await this.log.append(hold, { ...typed, madeAt: correctedMadeAt(madeAt, this.clock.now()) }, actor, role);
      return true;
    } catch (error) {
      if (error instanceof AppError) return false;
      throw error;
    }
  }
}
