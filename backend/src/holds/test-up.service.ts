import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { sayNoLongerUp, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Actor } from '../common/access/actor.js';
import { AppError, refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import type { LotParties } from '../lots/lots.policy.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { VisitsPresenter } from '../visits/visits.presenter.js';
import { canSayTestUp, downMoveOf, isVisitOfAnother } from './holds.policy.js';
import { LateTestUp } from './late-test-up.service.js';
import { requireStanding, standingTest } from './readiness.rules.js';
import { ReadingLog } from './reading-log.service.js';
import { requireCurrent } from './require-current.js';
import { TestDown } from './test-down.service.js';
import { TestUpModel } from './test-up.model.js';
import { TestUpStatements, type UpBody } from './test-up-statements.service.js';

type DownBody = RouteInput<typeof sayNoLongerUp>['body'];

/** The plumber's statement that the tests stand for the booked window, and its taking back. */
@Injectable()
export class TestUp {
  constructor(
    @InjectModel(TestUpModel) private readonly testUps: typeof TestUpModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly moves: VisitMoves,
    private readonly presenter: VisitsPresenter,
    private readonly statements: TestUpStatements,
    private readonly log: ReadingLog,
    private readonly down: TestDown,
    private readonly late: LateTestUp,
  ) {}

  /**
   * One that comes when the visit is no longer what was seen goes on as a late one.
   * @throws not-found, not-allowed, stale-state, said-too-late, move-not-allowed, over-limit, reading-missing, and what a reading may be
   * refused for
   */
  async say(actor: Actor, visitId: string, body: UpBody): Promise<VisitSummary> {
    try {
      return await this.unitOfWork.run(() => this.sayNow(actor, visitId, body));
    } catch (error) {
      if (!(error instanceof AppError) || error.code !== 'stale-state') throw error;
      return this.late.say(actor, visitId, body, error);
    }
  }

  /** @throws not-found, not-allowed, visit-of-another, stale-state */
  async sayNoLonger(actor: Actor, visitId: string, body: DownBody): Promise<VisitSummary> {
    return this.unitOfWork.run(async () => {
      const { visit, lot } = await this.moves.lockVisit(actor, visitId);
      const move = downMoveOf(actor, lot, visit) ?? refuseDown(actor, lot, visit);
      const at = correctedMadeAt(body.madeAt, this.clock.now());
      const note = body.note ?? null;
      if (await this.isTakenBack(actor, visit, body.expectedVersion)) return this.presenter.present(actor, visit.id);
      await this.down.take(actor, lot, visit, { move, expectedVersion: body.expectedVersion, at, note });
      return this.presenter.present(actor, visit.id);
    });
  }

  private async sayNow(actor: Actor, visitId: string, body: UpBody): Promise<VisitSummary> {
    const { visit, lot } = await this.moves.lockVisit(actor, visitId);
    if (!canSayTestUp(actor, lot)) refuse('not-allowed', { who: 'plumber' });
    const answeredId = await this.statements.findAnswered(visit, body.clientId);
    if (answeredId !== null) return this.presenter.present(actor, answeredId);
    requireCurrent(visit, 'say-test-up', body.expectedVersion);
    const required = await this.statements.requiredOf(visit);
    await this.addReadings(actor, visit, body);
    const standing = await this.statements.standingOf(visit);
    const readingIds = requireStanding(required, standing.map(standingTest));
    const saidAt = correctedMadeAt(body.madeAt, this.clock.now());
    await this.statements.makeReady(
      actor,
      visit,
      { clientId: body.clientId, saidAt, readingIds },
      body.expectedVersion,
    );
    return this.presenter.present(actor, visit.id);
  }

  /** The same person already took it back from that very version: the same act again. */
  private async isTakenBack(actor: Actor, visit: VisitModel, expectedVersion: number): Promise<boolean> {
    if (visit.state !== 'booked' || visit.version !== expectedVersion + 1) return false;
    const last = await this.testUps.findOne({ where: { visitId: visit.id }, order: [['receivedAt', 'DESC']] });
    return last?.endedBy === actor.personId;
  }

  private async addReadings(actor: Actor, visit: VisitModel, body: UpBody): Promise<void> {
    const standing = await this.statements.standingOf(visit);
    for (const [index, { holdId, madeAt, ...typed }] of (body.readings ?? []).entries()) {
      const path = `readings.${index}.`;
      const hold = standing.find((each) => each.hold.id === holdId)?.hold;
      if (hold === undefined) return refuse('bad-input', {}, { [`${path}holdId`]: 'not-standing-for-this-visit' });
      const corrected = correctedMadeAt(madeAt, this.clock.now());
      await this.log.append(hold, { ...typed, madeAt: corrected }, actor, 'plumber', path);
    }
  }
}

function refuseDown(actor: Actor, lot: LotParties, visit: VisitModel): never {
  if (isVisitOfAnother(actor, lot, visit)) refuse('visit-of-another', { inspectorId: visit.inspectorId });
  return refuse('not-allowed', { who: 'plumber-or-inspector' });
}
