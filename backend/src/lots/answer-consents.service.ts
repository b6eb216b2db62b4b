import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { answerConsents } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { answeringRole, canAnswerConsent, canSeeConsents } from './consents.policy.js';
import { type ConsentRecord, ConsentsQueries } from './consents.queries.js';
import { groupBy } from './group-by.js';
import { LotConsentModel } from './lot-consent.model.js';
import { LotPartiesQueries } from './lot-parties.queries.js';
import { LotModel } from './lot.model.js';
import { LotsQueries } from './lots.queries.js';

type Answer = RouteInput<typeof answerConsents>['body'];

/** An organization joins lots, or refuses to: all of those named, or none. */
@Injectable()
export class AnswerConsentsService {
  constructor(
    @InjectModel(LotConsentModel) private readonly models: typeof LotConsentModel,
    @InjectModel(LotModel) private readonly lotModels: typeof LotModel,
    private readonly consents: ConsentsQueries,
    private readonly lots: LotsQueries,
    private readonly parties: LotPartiesQueries,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /** Throws `not-found` (not asked), `not-allowed`, `stale-state` (params: the lot, and `attached` or `refused`) when answered before. */
  async answer(actor: Actor, answer: Answer): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      const lotIds = [...new Set(answer.lotIds)].sort();
      if (!canSeeConsents(actor, answer.organizationId)) refuse('not-found');
      if (!canAnswerConsent(actor, answer.organizationId)) refuse('not-allowed');
      for (const lotId of lotIds) await this.lots.lockLot(lotId);
      const asked = await this.consents.lockNewest(answer.organizationId, lotIds);
      if (asked.length < lotIds.length) refuse('not-found');
      refuseAnswered(asked);
      await this.write(actor, asked, answer);
      await this.record(actor, asked, answer);
      return { done: true };
    });
  }

  private async write(
    actor: Actor,
    asked: readonly ConsentRecord[],
    { isJoining, why, organizationId }: Answer,
  ): Promise<void> {
    const answered = {
      answeredBy: actor.personId,
      answeredAt: this.clock.now(),
      isJoining,
      why: isJoining ? null : (why ?? null),
    };
    await this.models.update(answered, { where: { id: asked.map(({ id }) => id) } });
    if (!isJoining) return;
    for (const { lotId, kind } of asked) {
      const place = kind === 'plumber' ? { plumberId: organizationId } : { departmentId: organizationId };
      await this.lotModels.update(place, { where: { id: lotId } });
    }
  }

  private async record(
    actor: Actor,
    asked: readonly ConsentRecord[],
    { organizationId, isJoining, ...answer }: Answer,
  ): Promise<void> {
    const why = answer.why ?? null;
    const who = { personId: actor.personId, role: answeringRole(actor, organizationId) };
    const organizationName = (await this.parties.listOrganizations([organizationId])).get(organizationId)?.name ?? '';
    for (const { lotId, kind } of asked) {
      const party = { kind, organizationId, organizationName };
      if (isJoining) await this.ledger.appendToLot(lotId, 'party-joined', party, who);
      else await this.ledger.appendToLot(lotId, 'party-refused', { ...party, why }, who);
      this.changes.lot(lotId, 'lot');
    }
    await this.tell(actor, asked, { isJoining, why });
  }

  /** Each builder is told once, however many of its lots were answered. */
  private async tell(
    actor: Actor,
    asked: readonly ConsentRecord[],
    { isJoining, why }: { isJoining: boolean; why: string | null },
  ): Promise<void> {
    const briefs = await this.lots.listBriefs(asked.map(({ lotId }) => lotId));
    for (const ofBuilder of groupBy(asked, ({ lotId }) => briefs.get(lotId)?.builderId).values()) {
      const [first] = ofBuilder;
      if (!first) continue;
      const subject = { lotId: first.lotId, actorId: actor.personId };
      const facts = { organizationId: first.organizationId, kind: first.kind, lotCount: ofBuilder.length };
      if (isJoining) await this.outbox.add('consent-given', subject, facts);
      else await this.outbox.add('consent-refused', subject, { ...facts, why });
    }
  }
}

function refuseAnswered(asked: readonly ConsentRecord[]): void {
  const answered = asked.find(({ isJoining }) => isJoining !== null);
  if (answered) refuse('stale-state', { lotId: answered.lotId, is: answered.isJoining ? 'attached' : 'refused' });
}
