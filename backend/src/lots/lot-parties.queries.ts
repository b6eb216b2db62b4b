import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import type { HandoverKind } from '@holdwater/shared-types/lots/lot.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

export interface OrganizationRecord {
  readonly id: string;
  readonly name: string;
  readonly kind: OrganizationKind;
  readonly phone: string | null;
}

/** An organization asked to join a lot: not answered yet, or the last refusal. */
export interface AskedParty {
  readonly consentId: string;
  readonly lotId: string;
  readonly kind: 'plumber' | 'department';
  readonly organizationId: string;
  readonly isPending: boolean;
}

@Injectable()
export class LotPartiesQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async listOrganizations(ids: readonly string[]): Promise<Map<string, OrganizationRecord>> {
    const found = await this.select<OrganizationRecord>(
      'SELECT id, name, kind, phone FROM organizations WHERE id = ANY (ARRAY[:ids]::uuid[])',
      {
        ids: [...ids],
      },
    );
    return new Map(found.map((organization) => [organization.id, organization]));
  }

  /** The newest asking of each kind on a lot, unless it was answered by joining. */
  async listAsked(lotId: string): Promise<AskedParty[]> {
    return this.select<AskedParty>(
      `SELECT * FROM (
         SELECT DISTINCT ON (kind) id AS "consentId", lot_id AS "lotId", kind, organization_id AS "organizationId",
           answered_at IS NULL AS "isPending", is_joining
         FROM lot_consents WHERE lot_id = :lotId AND kind IN ('plumber', 'department') AND replaces_id IS NULL ORDER BY kind, asked_at DESC, (answered_at IS NULL) DESC
       ) newest WHERE is_joining IS NOT TRUE ORDER BY kind DESC`,
      { lotId },
    );
  }

  /** Those asked to take the place of a party of the lot, without an answer yet. */
  async listOpenHandovers(lotId: string): Promise<Array<{ kind: HandoverKind; organizationId: string }>> {
    return this.select(
      `SELECT kind, organization_id AS "organizationId" FROM lot_consents
       WHERE lot_id = :lotId AND replaces_id IS NOT NULL AND answered_at IS NULL ORDER BY kind`,
      { lotId },
    );
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
