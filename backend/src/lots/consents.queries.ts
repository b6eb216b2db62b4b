import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import type { ConsentRequest, HandoverKind, TestToTakeOver } from '@holdwater/shared-types/lots/lot.contract.js';
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

/** An asking to take the place of another. */
export interface HandoverAsking {
  readonly id: string;
  readonly lotId: string;
  readonly kind: HandoverKind;
  readonly organizationId: string;
  readonly replacesId: string;
  readonly askedAt: Date;
  readonly isJoining: boolean | null;
}

type StandingRow = TestToTakeOver & { lotId: string };

interface OpenRow extends Omit<ConsentRequest, 'organization' | 'askedAt' | 'handover'> {
  replacesName: string | null;
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
         o.id AS "organizationId", o.name AS "organizationName", o.kind AS "organizationKind", o.phone AS "organizationPhone", c.asked_at AS "askedAt", r.name AS "replacesName"
       FROM lot_consents c JOIN lots l ON l.id = c.lot_id JOIN organizations b ON b.id = l.builder_id
       JOIN organizations o ON o.id = c.organization_id LEFT JOIN tracts t ON t.id = l.tract_id
       LEFT JOIN organizations r ON r.id = c.replaces_id
       WHERE c.answered_at IS NULL AND c.organization_id = ANY (ARRAY[:readerIds]::uuid[])
       ORDER BY c.asked_at, t.name, l.number, c.id`,
      { readerIds: organizationIds(actor) },
    );
    const replacing = rows.filter(({ replacesName }) => replacesName !== null);
    const tests = await this.listTestsToTakeOver(replacing.map(({ lotId }) => lotId));
    return rows.map(
      ({
        replacesName,
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
        handover:
          replacesName === null
            ? null
            : { replacesName, tests: row.kind === 'plumber' ? testsOf(tests, row.lotId) : [] },
      }),
    );
  }

  /** What stands on these lots, with the last reading that counts: all that is shown of it before the lot is taken over. */
  private async listTestsToTakeOver(lotIds: readonly string[]): Promise<StandingRow[]> {
    if (lotIds.length === 0) return [];
    return this.select<StandingRow>(
      `SELECT h.lot_id AS "lotId", h.id AS "holdId", h.unit_number AS "unitNumber", stage.name AS "stageName", h.system, h.ordinal,
         (h.system = 'dwv' AND h.medium = 'water') AS "isLevel", last.pressure_psi AS "lastPsi", last.level_in AS "lastLevelIn"
       FROM holds h JOIN lots l ON l.id = h.lot_id
       LEFT JOIN LATERAL (SELECT s.value -> 'name' AS name FROM rule_cards rc CROSS JOIN jsonb_array_elements(rc.content -> 'stages') s
         WHERE rc.department_id = l.department_id AND rc.state = 'published' AND s.value ->> 'code' = h.stage_code
         ORDER BY rc.version DESC LIMIT 1) stage ON true
       LEFT JOIN LATERAL (SELECT r.pressure_psi, r.level_in FROM readings r
         WHERE r.hold_id = h.id AND r.struck_at IS NULL AND r.gauge_valve IS DISTINCT FROM 'shut'
         ORDER BY r.made_at DESC, r.received_at DESC LIMIT 1) last ON true
       WHERE h.state = 'standing' AND h.lot_id = ANY (ARRAY[:lotIds]::uuid[]) ORDER BY h.stage_code, h.unit_number, h.system`,
      { lotIds: [...lotIds] },
    );
  }

  /** The newest asking of an organization to take another's place on a lot, open or answered; locked where asked for. */
  async findHandover(organizationId: string, lotId: string, isLocking = false): Promise<HandoverAsking | null> {
    const [found] = await this.select<HandoverAsking>(
      `SELECT id, lot_id AS "lotId", kind, organization_id AS "organizationId", replaces_id AS "replacesId", asked_at AS "askedAt",
         is_joining AS "isJoining"
       FROM lot_consents WHERE organization_id = :organizationId AND lot_id = :lotId AND replaces_id IS NOT NULL
       ORDER BY (answered_at IS NULL) DESC, answered_at DESC LIMIT 1 ${isLocking ? 'FOR UPDATE' : ''}`,
      { organizationId, lotId },
    );
    return found ?? null;
  }

  /** The newest asking of an organization on each of these lots, locked in order of lot; taking another's place is answered by itself. */
  async lockNewest(organizationId: string, lotIds: readonly string[]): Promise<ConsentRecord[]> {
    return this.select<ConsentRecord>(
      `SELECT c.id, c.lot_id AS "lotId", c.kind, c.organization_id AS "organizationId", c.is_joining AS "isJoining" FROM lot_consents c
       WHERE c.organization_id = :organizationId AND c.lot_id = ANY (ARRAY[:lotIds]::uuid[])
         AND c.id = (SELECT n.id FROM lot_consents n
           WHERE n.lot_id = c.lot_id AND n.organization_id = c.organization_id AND n.replaces_id IS NULL
           ORDER BY (n.answered_at IS NULL) DESC, n.answered_at DESC LIMIT 1)
       ORDER BY c.lot_id FOR UPDATE`,
      { organizationId, lotIds: [...lotIds] },
    );
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}

function testsOf(rows: readonly StandingRow[], lotId: string): TestToTakeOver[] {
  return rows.filter((row) => row.lotId === lotId).map(({ lotId: _, ...test }) => test);
}
