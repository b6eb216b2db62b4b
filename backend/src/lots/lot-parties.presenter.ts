import { Injectable } from '@nestjs/common';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { type LotPerson, LotPeopleQueries } from './lot-people.queries.js';
import { type AskedParty, LotPartiesQueries } from './lot-parties.queries.js';
import type { LotParties } from './lots.policy.js';

type Party = LotDetail['parties'][number];

/** The parties of a lot: those attached, with their people, and those asked or that refused, by name only. */
@Injectable()
export class LotPartiesPresenter {
  constructor(
    private readonly parties: LotPartiesQueries,
    private readonly people: LotPeopleQueries,
  ) {}

  async present(lot: LotParties & { id: string }): Promise<Party[]> {
    const attached = attachedOf(lot);
    const isFree = ({ kind }: AskedParty) => !attached.some((each) => each.kind === kind);
    const asked = (await this.parties.listAsked(lot.id)).filter(isFree).map(({ kind, organizationId, isPending }) => ({
      kind,
      organizationId,
      status: isPending ? ('pending' as const) : ('refused' as const),
    }));
    const named = [...attached, ...asked];
    const organizations = await this.parties.listOrganizations(named.map(({ organizationId }) => organizationId));
    const people = await this.people.listPeople(attached.map(({ organizationId }) => organizationId));
    return named.flatMap(({ kind, organizationId, status }) => {
      const organization = organizations.get(organizationId);
      return organization
        ? [{ kind, organization, status, people: (people.get(organizationId) ?? []).map(briefOf) }]
        : [];
    });
  }

  async presentHandovers(lotId: string): Promise<LotDetail['handovers']> {
    const open = await this.parties.listOpenHandovers(lotId);
    const organizations = await this.parties.listOrganizations(open.map(({ organizationId }) => organizationId));
    return open.flatMap(({ kind, organizationId }) => {
      const organization = organizations.get(organizationId);
      return organization ? [{ kind, organization }] : [];
    });
  }
}

function attachedOf({ builderId, plumberId, departmentId }: LotParties) {
  const attached: Array<{ kind: Party['kind']; organizationId: string; status: 'attached' }> = [];
  attached.push({ kind: 'builder', organizationId: builderId, status: 'attached' });
  if (plumberId !== null) attached.push({ kind: 'plumber', organizationId: plumberId, status: 'attached' });
  if (departmentId !== null) attached.push({ kind: 'department', organizationId: departmentId, status: 'attached' });
  return attached;
}

/** Names and phones are for each other's parties; addresses of mail are not. */
function briefOf({ id, name, phone }: LotPerson) {
  return { id, name, phone };
}
