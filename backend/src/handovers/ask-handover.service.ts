import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { HandoverKind, LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { Op } from 'sequelize';
import { type Actor, hasRole } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { LotConsentModel } from '../lots/lot-consent.model.js';
import { LotDetailPresenter } from '../lots/lot-detail.presenter.js';
import { LotPartiesQueries, type OrganizationRecord } from '../lots/lot-parties.queries.js';
import type { LotRecord } from '../lots/lot-record.js';
import { canAttachParty } from '../lots/lots.policy.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { Outbox } from '../notices/outbox.service.js';

/** Asks another plumber or builder to take the place of the one on a lot, who stays until the other agrees. */
@Injectable()
export class AskHandover {
  constructor(
    @InjectModel(LotConsentModel) private readonly consents: typeof LotConsentModel,
    private readonly lots: LotsQueries,
    private readonly parties: LotPartiesQueries,
    private readonly detail: LotDetailPresenter,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /**
   * Throws `not-found`, `not-allowed`, `party-already-attached` (it is the one on the lot), `party-pending`, and `bad-input` where there is
   * none to replace or no such organization of that kind.
   */
  async ask(actor: Actor, lotId: string, kind: HandoverKind, organizationId: string): Promise<LotDetail> {
    return this.unitOfWork.run(async () => {
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canAttachParty(actor, lot)) refuse('not-allowed');
      const formerId = partyIdOf(lot, kind) ?? refuse('bad-input', {}, { kind: 'none-to-replace' });
      if (formerId === organizationId) refuse('party-already-attached');
      if (await this.isAsking(lotId, kind)) refuse('party-pending');
      const named = await this.parties.listOrganizations([organizationId, formerId]);
      const organization = named.get(organizationId);
      if (organization?.kind !== kind) return refuse('bad-input', {}, { organizationId: 'unknown' });
      await this.write(actor, lot, kind, organization, named.get(formerId) ?? refuse('internal'));
      return this.detail.present(actor, lotId);
    });
  }

  /** Takes an asking back that nobody answered. Throws `not-found`, `not-allowed`, `stale-state` where none is open. */
  async withdraw(actor: Actor, lotId: string, kind: HandoverKind): Promise<LotDetail> {
    return this.unitOfWork.run(async () => {
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canAttachParty(actor, lot)) refuse('not-allowed');
      const open = { lotId, kind, answeredAt: null, replacesId: { [Op.ne]: null } };
      const asking = await this.consents.findOne({ where: open, lock: true });
      if (asking?.replacesId === undefined || asking.replacesId === null) return refuse('stale-state');
      await asking.update({ answeredBy: actor.personId, answeredAt: this.clock.now(), isJoining: false });
      const { organizationId, replacesId: formerId } = asking;
      const named = await this.parties.listOrganizations([organizationId, formerId]);
      const [organizationName, formerName] = [organizationId, formerId].map((id) => named.get(id)?.name ?? '');
      const payload = {
        kind,
        organizationId,
        organizationName: organizationName ?? '',
        formerId,
        formerName: formerName ?? '',
      };
      await this.ledger.appendToLot(lotId, 'handover-withdrawn', payload, whoAsks(actor, lot));
      this.changes.lot(lotId, 'lot');
      return this.detail.present(actor, lotId);
    });
  }

  private async write(
    actor: Actor,
    lot: LotRecord,
    kind: HandoverKind,
    { id: organizationId, name: organizationName }: OrganizationRecord,
    { id: formerId, name: formerName }: OrganizationRecord,
  ): Promise<void> {
    await this.consents.create({
      id: randomUUID(),
      ...{ lotId: lot.id, kind, organizationId, replacesId: formerId },
      askedBy: actor.personId,
      askedAt: this.clock.now(),
    });
    const payload = { kind, organizationId, organizationName, formerId, formerName };
    await this.ledger.appendToLot(lot.id, 'handover-asked', payload, whoAsks(actor, lot));
    const subject = { lotId: lot.id, actorId: actor.personId };
    await this.outbox.add('consent-asked', subject, { organizationId, kind, lotCount: 1 });
    this.changes.lot(lot.id, 'lot');
  }

  /** Somebody is asked for this place already, to take it over or to join. */
  private async isAsking(lotId: string, kind: HandoverKind): Promise<boolean> {
    return (await this.consents.count({ where: { lotId, kind, answeredAt: null } })) > 0;
  }
}

function whoAsks(actor: Actor, lot: LotRecord) {
  return {
    personId: actor.personId,
    role: hasRole(actor, lot.builderId, 'superintendent') ? 'superintendent' : 'owner',
  };
}

function partyIdOf(lot: LotRecord, kind: HandoverKind): string | null {
  return kind === 'builder' ? lot.builderId : lot.plumberId;
}
