import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { recordOutcome } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { spanOf } from '../common/time/ranges.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { HoldsQueries } from '../holds/holds.queries.js';
import { ReadingLog } from '../holds/reading-log.service.js';
import { getStage } from '../holds/test-rule.rules.js';
import { requireCurrent } from '../holds/require-current.js';
import type { LedgerActor } from '../ledger/ledger.service.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { VisitMoves } from '../visits/visit-moves.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { VisitsPresenter } from '../visits/visits.presenter.js';
import type { CorrectionModel } from './correction.model.js';
import { CorrectionMoves } from './correction-moves.service.js';
import { presentCorrection } from './corrections.presenter.js';
import { CorrectionsQueries } from './corrections.queries.js';
import { NewCorrections } from './new-corrections.service.js';
import type { OutcomeBody, SeenResult } from './outcome.input.js';
import { OutcomeModel } from './outcome.model.js';
import { OutcomeWriter, type Verdict } from './outcome-writer.service.js';
import { canInspect, isOwnVisit } from './outcomes.policy.js';
import { OutcomesQueries } from './outcomes.queries.js';
import { decideSeen } from './seen-visit.rules.js';

type Answer = RouteAnswer<typeof recordOutcome>;

/** The inspector closes a visit: answers, work, corrections, acceptances and reopenings in one act. */
@Injectable()
export class RecordOutcome {
  constructor(
    @InjectModel(OutcomeModel) private readonly outcomes: typeof OutcomeModel,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly changes: Changes,
    private readonly lots: LotsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly visits: VisitMoves,
    private readonly visitsPresenter: VisitsPresenter,
    private readonly holds: HoldsQueries,
    private readonly log: ReadingLog,
    private readonly corrections: CorrectionsQueries,
    private readonly opening: NewCorrections,
    private readonly moves: CorrectionMoves,
    private readonly writer: OutcomeWriter,
    private readonly queries: OutcomesQueries,
  ) {}

  /**
   * @throws not-found, not-allowed, stale-state, visit-of-another, window-not-open, bad-input, correction-unfixed, answers-missing,
   *   fail-needs-a-correction, pass-with-open-correction, reading-out-of-gauge, reading-in-the-future
   */
  async record(actor: Actor, visitId: string, body: OutcomeBody): Promise<Answer> {
    return this.unitOfWork.run(async () => {
      const { visit, lot } = await this.visits.lockVisit(actor, visitId);
      if (!canInspect(actor, lot)) refuse('not-allowed', { who: 'inspector' });
      if (await this.isRepeated(visit, body.clientId)) return this.answer(actor, visit);
      requireCurrent(visit, 'close', body.expectedVersion);
      if (!isOwnVisit(actor, visit)) refuse('visit-of-another', { inspectorId: visit.inspectorId });
      const madeAt = correctedMadeAt(body.madeAt, this.clock.now());
      await this.lots.lockLot(visit.lotId);
      await this.close(actor, visit, body, madeAt);
      this.changes.lot(visit.lotId, 'outcomes', 'holds', 'visits', 'lot');
      return this.answer(actor, visit);
    });
  }

  private async isRepeated(visit: VisitModel, clientId: string): Promise<boolean> {
    const earlier = await this.outcomes.findOne({ where: { clientId } });
    if (earlier !== null && earlier.visitId !== visit.id) refuse('bad-input', {}, { clientId: 'used-before' });
    return earlier !== null;
  }

  private async close(actor: Actor, visit: VisitModel, body: OutcomeBody, madeAt: Date): Promise<void> {
    const by: LedgerActor = { personId: actor.personId, role: 'inspector' };
    const { result, clientId, expectedVersion } = body;
    const entry = { clientId, note: body.note ?? null, madeAt, receivedAt: this.clock.now() };
    const verdict =
      result.kind === 'seen' ? await this.see(actor, visit, result, entry, by) : unseen(visit, result, madeAt);
    if (result.kind !== 'seen') await this.writer.write(visit, entry, verdict, null, by);
    // last, so that the plumbing state is worked out from everything above
    await this.visits.apply(visit, 'close', { expectedVersion, changes: { endedAt: madeAt } });
    await this.writer.tell(visit, verdict, by);
  }

  private async see(
    actor: Actor,
    visit: VisitModel,
    result: SeenResult,
    entry: Parameters<OutcomeWriter['write']>[1],
    by: LedgerActor,
  ): Promise<Verdict> {
    const { content } = await this.ruleCards.getRuleCard(visit.ruleCardId);
    const stage = getStage(content, visit.stageCode);
    const decided = [...result.accepted, ...result.reopened.map((each) => each.correctionId)];
    const locked = await this.moves.lockAll(decided);
    const earlier = await this.corrections.listOfLot(visit.lotId);
    const verdict = decideSeen(result, { stage, unitNumbers: visit.unitNumbers, corrections: earlier });
    await this.addReadings(actor, visit, result, entry.madeAt);
    await this.writer.write(visit, entry, verdict, { result, stage }, by);
    await this.opening.open(visit, result.corrections, entry.madeAt, by);
    await this.moveCorrections(locked, result, entry.madeAt, by);
    return verdict;
  }

  /** What the inspector read goes into the same log, marked; with no test standing it is kept with the outcome alone. */
  private async addReadings(actor: Actor, visit: VisitModel, result: SeenResult, madeAt: Date): Promise<void> {
    const standing = await this.holds.listStanding(visit.lotId, visit.stageCode, visit.unitNumbers, true);
    for (const [index, { unitNumber, system, pressurePsi, levelIn }] of result.systems.entries()) {
      const test = standing.find(({ hold }) => hold.unitNumber === unitNumber && hold.system === system);
      const isRead = typeof pressurePsi === 'number' || typeof levelIn === 'number';
      if (test === undefined || !isRead) continue;
      // the inspector opens the gauge valve to read
      const gaugeValve = typeof pressurePsi === 'number' ? 'open' : null;
      const reading = { clientId: randomUUID(), madeAt, pressurePsi, levelIn, gaugeValve } as const;
      await this.log.append(test.hold, reading, actor, 'inspector', `result.systems.${index}.`);
    }
  }

  private async moveCorrections(
    locked: readonly CorrectionModel[],
    result: SeenResult,
    at: Date,
    by: LedgerActor,
  ): Promise<void> {
    for (const correction of [...locked].sort((a, b) => a.number - b.number)) {
      const reopened = result.reopened.find((each) => each.correctionId === correction.id);
      const step = reopened ? ({ move: 'reopen', why: reopened.why, at } as const) : ({ move: 'accept', at } as const);
      await this.moves.apply(correction, step, by);
    }
  }

  private async answer(actor: Actor, visit: VisitModel): Promise<Answer> {
    const corrections = await this.corrections.listOfLot(visit.lotId);
    return {
      visit: await this.visitsPresenter.present(actor, visit.id),
      outcome: (await this.queries.findOfVisit(visit.id)) ?? refuse('not-found'),
      corrections: corrections.map((row) => presentCorrection(actor, row)),
    };
  }
}

/** Not ready and no access cost the builder something, so only once the window has opened. */
function unseen(visit: VisitModel, result: { kind: 'not-ready' | 'no-access'; reason: string }, madeAt: Date): Verdict {
  const opensAt = spanOf(visit.window).startAt;
  if (madeAt < opensAt) refuse('window-not-open', { opensAt: opensAt.toISOString() });
  return { kind: result.kind, reason: result.reason };
}
