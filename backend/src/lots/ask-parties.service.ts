import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { type Actor, hasRole } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { DepartmentsQueries } from '../departments/departments.queries.js';
import { Ledger } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { LotConsentModel } from './lot-consent.model.js';
import { LotDetailPresenter } from './lot-detail.presenter.js';
import { LotPartiesQueries, type OrganizationRecord } from './lot-parties.queries.js';
import type { LotRecord } from './lot-record.js';
import { LotModel } from './lot.model.js';
import { canAttachParty } from './lots.policy.js';
import { LotsQueries } from './lots.queries.js';

export type AskedKind = 'plumber' | 'department';

/** Asks organizations to join lots. An outside department, which is not on Holdwater and cannot answer, joins at once. */
@Injectable()
export class AskPartiesService {
  constructor(
    @InjectModel(LotConsentModel) private readonly consents: typeof LotConsentModel,
    @InjectModel(LotModel) private readonly lotModels: typeof LotModel,
    private readonly lots: LotsQueries,
    private readonly parties: LotPartiesQueries,
    private readonly departments: DepartmentsQueries,
    private readonly detail: LotDetailPresenter,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /** Throws `not-found`, `not-allowed`, `party-already-attached`, `party-pending` and, for an organization that is none, `bad-input`. */
  async attach(actor: Actor, lotId: string, kind: AskedKind, organizationId: string): Promise<LotDetail> {
    return this.unitOfWork.run(async () => {
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canAttachParty(actor, lot)) refuse('not-allowed');
      await this.refuseTaken(lot, kind);
      const organization = await this.getOrganization(kind, organizationId, 'organizationId');
      await this.ask(actor, lot.builderId, [lot.id], organization, kind);
      return this.detail.present(actor, lotId);
    });
  }

  /** Throws `bad-input` on `field` when there is no such organization of that kind. */
  async getOrganization(kind: AskedKind, organizationId: string, field: string): Promise<OrganizationRecord> {
    const organization = (await this.parties.listOrganizations([organizationId])).get(organizationId);
    return organization?.kind === kind ? organization : refuse('bad-input', {}, { [field]: 'unknown' });
  }

  /** Asks one organization about several lots of a builder at once, with one notice for all of them. Inside the caller's unit of work. */
  async ask(
    actor: Actor,
    builderId: string,
    lotIds: readonly string[],
    organization: OrganizationRecord,
    kind: AskedKind,
  ): Promise<void> {
    const isOutside =
      kind === 'department' && ((await this.departments.findDepartment(organization.id))?.isOutside ?? false);
    await this.consents.bulkCreate(
      lotIds.map((lotId) => this.consentOf(actor, lotId, organization.id, kind, isOutside)),
    );
    if (isOutside) await this.lotModels.update({ departmentId: organization.id }, { where: { id: [...lotIds] } });
    const who = {
      personId: actor.personId,
      role: hasRole(actor, builderId, 'superintendent') ? 'superintendent' : 'owner',
    };
    const payload = { kind, organizationId: organization.id, organizationName: organization.name };
    for (const lotId of lotIds) {
      await this.ledger.appendToLot(lotId, isOutside ? 'party-joined' : 'party-asked', payload, who);
      this.changes.lot(lotId, 'lot');
    }
    if (isOutside) return;
    const subject = { lotId: lotIds[0] ?? null, actorId: actor.personId };
    await this.outbox.add('consent-asked', subject, { organizationId: organization.id, kind, lotCount: lotIds.length });
  }

  private consentOf(actor: Actor, lotId: string, organizationId: string, kind: AskedKind, isOutside: boolean) {
    const now = this.clock.now();
    const answer = { answeredBy: actor.personId, answeredAt: now, isJoining: true };
    return {
      id: randomUUID(),
      lotId,
      kind,
      organizationId,
      askedBy: actor.personId,
      askedAt: now,
      ...(isOutside && answer),
    };
  }

  private async refuseTaken(lot: LotRecord, kind: AskedKind): Promise<void> {
    if ((kind === 'plumber' ? lot.plumberId : lot.departmentId) !== null) refuse('party-already-attached');
    const asked = await this.parties.listAsked(lot.id);
    if (asked.some((each) => each.kind === kind && each.isPending)) refuse('party-pending');
  }
}
