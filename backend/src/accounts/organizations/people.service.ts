import type {
  changeMember,
  invitePerson,
  Invitation,
  Member,
  readPeople,
} from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Transaction } from 'sequelize';
import type { Actor } from '../../common/access/actor.js';
import { Changes } from '../../common/changes/changes.js';
import { refuse } from '../../common/errors/app-error.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../../ledger/ledger.service.js';
import { canManagePeople, canReadPeople, keepsOwner, rolesAmiss } from '../accounts.policy.js';
import { briefOfOrganization, presentInvitation, presentMember } from '../accounts.presenter.js';
import { Invitations } from '../invitations/invitations.service.js';
import { MembershipModel } from '../membership.model.js';
import { OrganizationModel } from '../organization.model.js';
import { PersonModel } from '../person.model.js';

type MemberChange = RouteInput<typeof changeMember>['body'];

/** The people of an organization: who they are, who is invited, what they may do. */
@Injectable()
export class OrganizationPeople {
  constructor(
    @InjectModel(OrganizationModel) private readonly organizations: typeof OrganizationModel,
    @InjectModel(MembershipModel) private readonly memberships: typeof MembershipModel,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly invitations: Invitations,
    private readonly ledger: Ledger,
    private readonly unitOfWork: UnitOfWork,
    private readonly changes: Changes,
  ) {}

  /** Invitations are shown to whoever manages them. */
  async read(actor: Actor, organizationId: string): Promise<RouteAnswer<typeof readPeople>> {
    const organization = await this.getReadable(actor, organizationId);
    const memberships = await this.memberships.findAll({ where: { organizationId } });
    const persons = await this.personsOf(memberships);
    const people = memberships
      .map((each) => memberOf(each, persons))
      .sort((a, b) => a.name.localeCompare(b.name, 'en'));
    const canManage = canManagePeople(actor, organizationId);
    const invitations = canManage ? (await this.invitations.listOpen(organizationId)).map(presentInvitation) : [];
    return { organization: briefOfOrganization(organization), people, invitations, abilities: { canManage } };
  }

  async invite(
    actor: Actor,
    organizationId: string,
    body: RouteInput<typeof invitePerson>['body'],
  ): Promise<Invitation> {
    return this.unitOfWork.run(async () => {
      const organization = await this.getManaged(actor, organizationId);
      const roles = assertRoles(organization, body.roles);
      return presentInvitation(await this.invitations.invite(organization, { ...body, roles }, asOwner(actor)));
    });
  }

  async withdraw(actor: Actor, organizationId: string, invitationId: string): Promise<{ done: true }> {
    return this.unitOfWork.run(async () => {
      await this.getManaged(actor, organizationId);
      await this.invitations.withdraw(organizationId, invitationId, asOwner(actor));
      return { done: true };
    });
  }

  /** Throws `last-owner` where nobody would be left who can act as owner. Disabling ends nothing in other organizations. */
  async change(actor: Actor, organizationId: string, personId: string, change: MemberChange): Promise<Member> {
    return this.unitOfWork.run(async () => {
      const organization = await this.getManaged(actor, organizationId);
      if (change.roles) assertRoles(organization, change.roles);
      // all of them are locked: two owners may be taking each other's role at once
      const memberships = await this.memberships.findAll({
        where: { organizationId },
        order: ['id'],
        lock: Transaction.LOCK.UPDATE,
      });
      const membership = memberships.find((each) => each.personId === personId) ?? refuse('not-found');
      const persons = await this.personsOf(memberships);
      await this.write(actor, memberships, membership, persons, change);
      return memberOf(membership, persons);
    });
  }

  private async write(
    actor: Actor,
    memberships: MembershipModel[],
    membership: MembershipModel,
    persons: Map<string, PersonModel>,
    change: MemberChange,
  ): Promise<void> {
    const { personId, organizationId } = membership;
    const after = {
      roles: [...new Set(change.roles ?? membership.roles)],
      isDisabled: change.isDisabled ?? membership.isDisabled,
    };
    const ownership = (
      each: MembershipModel,
      { roles, isDisabled } = { roles: each.roles, isDisabled: each.isDisabled },
    ) => ({
      personId: each.personId,
      roles,
      isDisabled: isDisabled || persons.get(each.personId)?.isDisabled === true,
    });
    if (
      !keepsOwner(
        memberships.map((each) => ownership(each)),
        ownership(membership, after),
      )
    )
      refuse('last-owner');
    await membership.update(after);
    this.changes.access({ personId });
    await this.ledger.appendTo(
      `organization:${organizationId}`,
      'person-changed',
      { personId, ...change, ...(change.roles && { roles: after.roles }) },
      asOwner(actor),
    );
  }

  private async getReadable(actor: Actor, organizationId: string): Promise<OrganizationModel> {
    if (!canReadPeople(actor, organizationId)) refuse('not-found');
    return this.organizations.findByPk(organizationId, { rejectOnEmpty: true });
  }

  private async getManaged(actor: Actor, organizationId: string): Promise<OrganizationModel> {
    const organization = await this.getReadable(actor, organizationId);
    return canManagePeople(actor, organizationId) ? organization : refuse('not-allowed', { needs: 'owner' });
  }

  private async personsOf(memberships: MembershipModel[]): Promise<Map<string, PersonModel>> {
    const persons = await this.persons.findAll({ where: { id: memberships.map((each) => each.personId) } });
    return new Map(persons.map((person) => [person.id, person]));
  }
}

function memberOf({ personId, roles, isDisabled }: MembershipModel, persons: Map<string, PersonModel>): Member {
  const person = persons.get(personId);
  if (!person) throw new Error(`a membership of person ${personId}, who is not there`);
  return presentMember(person, roles, isDisabled);
}

function assertRoles({ kind }: OrganizationModel, roles: readonly MemberRole[]): MemberRole[] {
  const amiss = rolesAmiss(kind, roles);
  const fields = Object.fromEntries(amiss.map((role) => [`roles.${roles.indexOf(role)}`, 'not-one-of-the-choices']));
  return amiss.length > 0 ? refuse('bad-input', {}, fields) : [...new Set(roles)];
}

function asOwner(actor: Actor) {
  return { personId: actor.personId, role: 'owner' };
}
