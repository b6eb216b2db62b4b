import { randomUUID } from 'node:crypto';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op, Transaction } from 'sequelize';
import { refuse } from '../../common/errors/app-error.js';
import { Clock } from '../../common/time/clock.js';
import { Ledger, type LedgerActor } from '../../ledger/ledger.service.js';
import { AccountMail } from '../account-mail.service.js';
import { AccountsQueries } from '../accounts.queries.js';
import { InvitationModel } from '../invitation.model.js';
import { MembershipModel } from '../membership.model.js';
import type { OrganizationModel } from '../organization.model.js';
import { PersonModel } from '../person.model.js';
import { linkMinutes, Links } from '../tokens/links.service.js';

export interface Invited {
  email: string;
  name: string;
  roles: readonly MemberRole[];
}

/** Writes invitations; inside the unit of work of whoever may invite. */
@Injectable()
export class Invitations {
  constructor(
    @InjectModel(InvitationModel) private readonly invitations: typeof InvitationModel,
    @InjectModel(MembershipModel) private readonly memberships: typeof MembershipModel,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly queries: AccountsQueries,
    private readonly links: Links,
    private readonly mail: AccountMail,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
  ) {}

  /** Throws `already-member` for who belongs to it, disabled or not, and for who has an open invitation. */
  async invite(organization: OrganizationModel, invited: Invited, by: LedgerActor): Promise<InvitationModel> {
    const person = await this.queries.findPersonByEmail(invited.email);
    await this.assertNewIn(organization.id, person);
    await this.withdrawExpired(organization.id, invited.email);
    const invitation = await this.create(organization.id, invited, by.personId);
    const token = await this.links.issue('invitation', { invitationId: invitation.id });
    const inviter = await this.persons.findByPk(by.personId, { rejectOnEmpty: true });
    await this.ledger.appendTo(
      `organization:${organization.id}`,
      'person-invited',
      { email: invited.email, roles: [...invited.roles] },
      by,
    );
    await this.mail.add({
      mail: 'invitation',
      to: { email: invited.email, name: person?.name ?? invited.name, locale: person?.locale ?? inviter.locale },
      token,
      organizationName: organization.name,
      invitedByName: inviter.name,
      actorId: inviter.id,
    });
    return invitation;
  }

  /** Throws `not-found` for one that is not open here. */
  async withdraw(organizationId: string, invitationId: string, by: LedgerActor): Promise<void> {
    const where = { id: invitationId, organizationId, acceptedAt: null, withdrawnAt: null };
    const invitation = await this.invitations.findOne({ where, lock: Transaction.LOCK.UPDATE });
    if (!invitation) return refuse('not-found');
    await invitation.update({ withdrawnAt: this.clock.now() });
    await this.ledger.appendTo(
      `organization:${organizationId}`,
      'invitation-withdrawn',
      { email: invitation.email },
      by,
    );
  }

  /** Those that still can be accepted, oldest first. */
  async listOpen(organizationId: string): Promise<InvitationModel[]> {
    const where = { organizationId, acceptedAt: null, withdrawnAt: null, expiresAt: { [Op.gt]: this.clock.now() } };
    return this.invitations.findAll({ where, order: ['createdAt', 'id'] });
  }

  private async assertNewIn(organizationId: string, person: PersonModel | null): Promise<void> {
    if (!person) return;
    const membership = await this.memberships.findOne({ where: { organizationId, personId: person.id } });
    if (membership) refuse('already-member');
  }

  /** One that ran out makes room for the next. */
  private async withdrawExpired(organizationId: string, email: string): Promise<void> {
    const now = this.clock.now();
    const where = { organizationId, email, acceptedAt: null, withdrawnAt: null, expiresAt: { [Op.lte]: now } };
    await this.invitations.update({ withdrawnAt: now }, { where });
  }

  private async create(
    organizationId: string,
    { email, name, roles }: Invited,
    invitedBy: string,
  ): Promise<InvitationModel> {
    const now = this.clock.now();
    return this.invitations.create({
      id: randomUUID(),
      organizationId,
      email,
      name,
      roles: [...roles],
      isOperator: false,
      invitedBy,
      createdAt: now,
      expiresAt: new Date(now.getTime() + linkMinutes.invitation * 60_000),
    });
  }
}
