import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { answerHandover } from '@holdwater/shared-types/lots/handover.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { answeringRole, canAnswerConsent, canSeeConsents } from '../lots/consents.policy.js';
import { ConsentsQueries, type HandoverAsking } from '../lots/consents.queries.js';
import { LotConsentModel } from '../lots/lot-consent.model.js';
import { LotPartiesQueries } from '../lots/lot-parties.queries.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { Outbox } from '../notices/outbox.service.js';
import { CalendarEntries } from '../visits/calendar-entries.service.js';
import { HandOver } from './hand-over.service.js';

type Answer = RouteInput<typeof answerHandover>['body'];

/** The one asked takes a lot over, or refuses to. */
@Injectable()
export class AnswerHandover {
  constructor(
    @InjectModel(LotConsentModel) private readonly models: typeof LotConsentModel,
    private readonly consents: ConsentsQueries,
    private readonly lots: LotsQueries,
    private readonly parties: LotPartiesQueries,
    private readonly entries: CalendarEntries,
    private readonly handing: HandOver,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /**
   * Throws `not-found` (not asked), `not-allowed`, `stale-state` (`attached` or `refused`) when answered before, `party-has-visit` while an
   * inspector is there, and what a reading may be refused for.
   */
  async answer(actor: Actor, lotId: string, answer: Answer): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      const { organizationId } = answer;
      if (!canSeeConsents(actor, organizationId)) refuse('not-found');
      if ((await this.consents.findHandover(organizationId, lotId)) === null) refuse('not-found');
      if (!canAnswerConsent(actor, organizationId)) refuse('not-allowed');
      // visits before the lot, as every act locks them
      const visits = await this.entries.lockOpen([lotId]);
      const lot = await this.lots.lockLot(lotId);
      const asking = (await this.consents.findHandover(organizationId, lotId, true)) ?? refuse('not-found');
      refuseAnswered(asking);
      await this.write(actor, asking, answer);
      if (answer.isJoining) await this.handing.over(actor, { lot, visits, asking, takeOver: answer.takeOver ?? [] });
      else await this.refused(actor, asking, answer.why ?? null);
      this.changes.lot(lotId, 'lot', 'visits', 'holds');
      return { done: true } as const;
    });
  }

  private async write(actor: Actor, asking: HandoverAsking, { isJoining, why }: Answer): Promise<void> {
    const answeredAt = this.clock.now();
    const answered = { answeredBy: actor.personId, answeredAt, isJoining, why: isJoining ? null : (why ?? null) };
    await this.models.update(answered, { where: { id: asking.id } });
  }

  private async refused(actor: Actor, asking: HandoverAsking, why: string | null): Promise<void> {
    const { lotId, kind, organizationId, replacesId: formerId } = asking;
    const names = await this.parties.listOrganizations([organizationId, formerId]);
    const organizationName = names.get(organizationId)?.name ?? '';
    const formerName = names.get(formerId)?.name ?? '';
    const who = { personId: actor.personId, role: answeringRole(actor, organizationId) };
    await this.ledger.appendToLot(
      lotId,
      'handover-refused',
      { kind, organizationId, organizationName, formerId, formerName, why },
      who,
    );
    const subject = { lotId, actorId: actor.personId };
    await this.outbox.add('consent-refused', subject, { organizationId, kind, why, lotCount: 1 });
  }
}

function refuseAnswered({ lotId, isJoining }: HandoverAsking): void {
  if (isJoining !== null) refuse('stale-state', { lotId, is: isJoining ? 'attached' : 'refused' });
}
