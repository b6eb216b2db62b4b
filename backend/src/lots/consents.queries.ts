import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import type { ConsentRequest } from '@holdwater/shared-types/lots/lot.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { type Actor, organizationIds } from '../common/access/actor.js';

/** An asking of an organization about a lot, open or answered. */
export interface ConsentRecord {
  readonly id: string;
  readonly lotId: string;
  readonly kind: 'plumber' | 'department';
  readonly organizationId: string;
  readonly isJoining: boolean | null;
}

interface OpenRow extends Omit<ConsentRequest, 'organization' | 'askedAt'> {
  organizationId: string;
  organizationName: string;
  organizationKind: OrganizationKind;
  organizationPhone: string | null;
  askedAt: Date;
}

@Injectable()
export class ConsentsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** What the actor's organizations are asked and have not answered: all that is shown of a lot until they join it. */
  async listOpen(actor: Actor): Promise<ConsentRequest[]> {
    const rows = await this.select<OpenRow>(
      `SELECT c.lot_id AS "lotId", l.number AS "lotNumber", t.name AS "tractName", l.address, b.name AS "builderName", c.kind,
         o.id AS "organizationId", o.name AS "organizationName", o.kind AS "organizationKind", o.phone AS "organizationPhone", c.asked_at AS "askedAt"
       FROM lot_consents c JOIN lots l ON l.id = c.lot_id JOIN organizations b ON b.id = l.builder_id
       JOIN organizations o ON o.id = c.organization_id LEFT JOIN tracts t ON t.id = l.tract_id
       WHERE c.answered_at IS NULL AND c.organization_id = ANY (ARRAY[:readerIds]::uuid[])
       ORDER BY c.asked_at, t.name, l.number, c.id`,
      { readerIds: organizationIds(actor) },
    );
    return rows.map(
      ({
        organizationId: id,
        organizationName: name,
        organizationKind: kind,
        organizationPhone: phone,
        askedAt,
        ...row
      }) => ({
        ...row,
        organization: { id, name, kind, phone },
        askedAt: askedAt.toISOString(),
      }),
    );
  }

  /** The newest asking of an organization on each of these lots, locked in order of lot. */
  async lockNewest(organizationId: string, lotIds: readonly string[]): Promise<ConsentRecord[]> {
    return this.select<ConsentRecord>(
      `SELECT c.id, c.lot_id AS "lotId", c.kind, c.organization_id AS "organizationId", c.is_joining AS "isJoining" FROM lot_consents c
       WHERE c.organization_id = :organizationId AND c.lot_id = ANY (ARRAY[:lotIds]::uuid[])
         AND c.id = (SELECT n.id FROM lot_consents n WHERE n.lot_id = c.lot_id AND n.organization_id = c.organization_id
           ORDER BY (n.answered_at IS NULL) DESC, n.answered_at DESC LIMIT 1)
       ORDER BY c.lot_id FOR UPDATE`,
      { organizationId, lotIds: [...lotIds] },
    );
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
