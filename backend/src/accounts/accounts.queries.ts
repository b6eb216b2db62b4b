import type { Me, OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { briefOfOrganization } from './accounts.presenter.js';
import { OrganizationModel } from './organization.model.js';
import { PersonModel } from './person.model.js';

/** What other modules may know of a person. */
export interface PersonFacts {
  id: string;
  name: string;
  email: string;
  phone: string | null;
  locale: Locale;
  units: 'us' | 'metric';
  isDisabled: boolean;
}

/** A person in force in one organization. */
export interface MemberFacts extends PersonFacts {
  organizationId: string;
  roles: MemberRole[];
}

const personColumns = `p.id, p.name, p.email, p.phone, p.locale, p.units, p.is_disabled AS "isDisabled"`;

/** How other modules read people and organizations. */
@Injectable()
export class AccountsQueries {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    @InjectModel(OrganizationModel) private readonly organizations: typeof OrganizationModel,
  ) {}

  /** Everyone in force in these organizations, by name; with `roles`, only who has one of them. Nobody disabled, here or altogether. */
  async listMembers(organizationIds: readonly string[], roles?: readonly MemberRole[]): Promise<MemberFacts[]> {
    if (organizationIds.length === 0 || roles?.length === 0) return [];
    return this.sequelize.query<MemberFacts>(
      `SELECT ${personColumns}, m.organization_id AS "organizationId", m.roles FROM memberships m JOIN persons p ON p.id = m.person_id
       WHERE m.organization_id IN (:organizationIds) AND NOT m.is_disabled AND NOT p.is_disabled
         ${roles ? 'AND m.roles && ARRAY[:roles]::text[]' : ''}
       ORDER BY p.name, p.id`,
      {
        replacements: { organizationIds: [...organizationIds], ...(roles && { roles: [...roles] }) },
        type: QueryTypes.SELECT,
      },
    );
  }

  /** The people of these ids, disabled ones too. Throws when one does not exist. */
  async getPersons(ids: readonly string[]): Promise<Map<string, PersonFacts>> {
    const wanted = [...new Set(ids)];
    if (wanted.length === 0) return new Map();
    const found = await this.sequelize.query<PersonFacts>(
      `SELECT ${personColumns} FROM persons p WHERE p.id IN (:wanted)`,
      {
        replacements: { wanted },
        type: QueryTypes.SELECT,
      },
    );
    return mapOfAll(wanted, found);
  }

  /** The organizations of these ids. Throws when one does not exist. */
  async getOrganizations(ids: readonly string[]): Promise<Map<string, OrganizationBrief>> {
    const wanted = [...new Set(ids)];
    const found = wanted.length === 0 ? [] : await this.organizations.findAll({ where: { id: wanted } });
    return mapOfAll(wanted, found.map(briefOfOrganization));
  }

  async findOrganization(id: string): Promise<OrganizationBrief | null> {
    const organization = await this.organizations.findByPk(id);
    return organization && briefOfOrganization(organization);
  }

  async findPersonByEmail(email: string): Promise<PersonModel | null> {
    return this.persons.findOne({ where: { email: email.toLowerCase() } });
  }

  /** The organizations a person is in force in, with the roles there, oldest first. */
  async listMembershipsOf(personId: string): Promise<Me['memberships']> {
    return this.sequelize.query<Me['memberships'][number]>(
      `SELECT json_build_object('id', o.id, 'name', o.name, 'kind', o.kind, 'phone', o.phone) AS organization, m.roles
       FROM memberships m JOIN organizations o ON o.id = m.organization_id
       WHERE m.person_id = :personId AND NOT m.is_disabled ORDER BY m.created_at, m.id`,
      { replacements: { personId }, type: QueryTypes.SELECT },
    );
  }
}

function mapOfAll<T extends { id: string }>(wanted: readonly string[], found: readonly T[]): Map<string, T> {
  const byId = new Map(found.map((each) => [each.id, each]));
  const missing = wanted.filter((id) => !byId.has(id));
  if (missing.length > 0) throw new Error(`there is no row ${missing.join(', ')}`);
  return byId;
}
