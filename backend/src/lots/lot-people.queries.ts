import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { groupBy } from './group-by.js';

/** A person one talks to at a party of a lot. */
export interface LotPerson {
  readonly id: string;
  readonly organizationId: string;
  readonly name: string;
  readonly phone: string | null;
  readonly email: string;
  readonly locale: string;
  readonly roles: readonly MemberRole[];
}

/** Who stands for an organization on a lot: the superintendents of a builder, the plumbers of a plumber, inspectors and desk of a department. */
const spokenForBy: readonly MemberRole[] = ['superintendent', 'plumber', 'inspector', 'desk'];

@Injectable()
export class LotPeopleQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** By organization, those in force with a role that stands for it on a lot, by name. */
  async listPeople(
    organizationIds: readonly string[],
    roles: readonly MemberRole[] = spokenForBy,
  ): Promise<Map<string, LotPerson[]>> {
    const found = await this.sequelize.query<LotPerson>(
      `SELECT p.id, m.organization_id AS "organizationId", p.name, p.phone, p.email, p.locale, m.roles
       FROM memberships m JOIN persons p ON p.id = m.person_id
       WHERE m.organization_id = ANY (ARRAY[:organizationIds]::uuid[]) AND m.roles && ARRAY[:roles]::text[]
         AND NOT m.is_disabled AND NOT p.is_disabled
       ORDER BY p.name, p.id`,
      { replacements: { organizationIds: [...organizationIds], roles: [...roles] }, type: QueryTypes.SELECT },
    );
    return groupBy(found, ({ organizationId }) => organizationId);
  }
}
