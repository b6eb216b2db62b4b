import {
  changeMember,
  createOrganization,
  invitePerson,
  listOrganizations,
  readPeople,
  withdrawInvitation,
} from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { Controller } from '@nestjs/common';
import { operatorOnly, signedIn } from '../../common/access/access.js';
import type { Actor } from '../../common/access/actor.js';
import { CurrentActor } from '../../common/access/current-actor.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { Organizations } from './organizations.service.js';
import { OrganizationPeople } from './people.service.js';

@Controller()
export class OrganizationsController {
  constructor(
    private readonly organizations: Organizations,
    private readonly people: OrganizationPeople,
  ) {}

  @ContractRoute(listOrganizations, signedIn('own'))
  list(@Input() { query }: RouteInput<typeof listOrganizations>) {
    return this.organizations.list(query);
  }

  @ContractRoute(createOrganization, operatorOnly)
  create(@Input() { body }: RouteInput<typeof createOrganization>, @CurrentActor() actor: Actor) {
    return this.organizations.create(actor, body);
  }

  @ContractRoute(readPeople, signedIn('accounts.canReadPeople'))
  read(@Input() { params }: RouteInput<typeof readPeople>, @CurrentActor() actor: Actor) {
    return this.people.read(actor, params.organizationId);
  }

  @ContractRoute(invitePerson, signedIn('accounts.canManagePeople'))
  invite(@Input() { params, body }: RouteInput<typeof invitePerson>, @CurrentActor() actor: Actor) {
    return this.people.invite(actor, params.organizationId, body);
  }

  @ContractRoute(withdrawInvitation, signedIn('accounts.canManagePeople'))
  withdraw(@Input() { params }: RouteInput<typeof withdrawInvitation>, @CurrentActor() actor: Actor) {
    return this.people.withdraw(actor, params.organizationId, params.invitationId);
  }

  @ContractRoute(changeMember, signedIn('accounts.canManagePeople'))
  change(@Input() { params, body }: RouteInput<typeof changeMember>, @CurrentActor() actor: Actor) {
    return this.people.change(actor, params.organizationId, params.personId, body);
  }
}
