import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Medium, Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

/** A test plan that would be looked at anew under another version. */
export interface StandingPlan {
  readonly lotId: string;
  readonly lotNumber: string;
  readonly tractName: string | null;
  readonly stageCode: string;
  readonly system: System;
  readonly method: Method;
  readonly medium: Medium;
  /** The version it was made by. */
  readonly ruleCardId: string;
}

const open = `('requested', 'booked', 'ready', 'underway')`;

/** What stands in the other modules' tables that a new version touches. */
@Injectable()
export class RuleCardTouchesQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Open visits of a department, by whether they are booked and the version they are held to. */
  async countOpenVisits(departmentId: string): Promise<Array<{ isBooked: boolean; version: number; visits: number }>> {
    return this.select(
      `SELECT v.state <> 'requested' AS "isBooked", rc.version, count(*)::int AS visits
       FROM visits v JOIN rule_cards rc ON rc.id = v.rule_card_id
       WHERE v.department_id = :departmentId AND v.state IN ${open} GROUP BY 1, 2 ORDER BY 2`,
      departmentId,
    );
  }

  async countLotsWithoutVisit(departmentId: string): Promise<number> {
    const [row] = await this.select<{ lots: number }>(
      `SELECT count(*)::int AS lots FROM lots l WHERE l.department_id = :departmentId
         AND NOT EXISTS (SELECT 1 FROM visits v WHERE v.lot_id = l.id AND v.state IN ${open})`,
      departmentId,
    );
    return row?.lots ?? 0;
  }

  /** Those who are told of a new version: builder's and plumber's people with an open visit, and the department's own. */
  async listTold(departmentId: string): Promise<Array<{ organizationId: string; name: string; people: number }>> {
    return this.select(
      `WITH concerned AS (
         SELECT unnest(ARRAY[l.builder_id, l.plumber_id]) AS id FROM visits v JOIN lots l ON l.id = v.lot_id
         WHERE v.department_id = :departmentId AND v.state IN ${open}
         UNION SELECT CAST(:departmentId AS uuid))
       SELECT o.id AS "organizationId", o.name, count(DISTINCT p.id)::int AS people
       FROM concerned c JOIN organizations o ON o.id = c.id
       JOIN memberships m ON m.organization_id = o.id AND NOT m.is_disabled
         AND m.roles && ARRAY['superintendent', 'plumber', 'inspector', 'desk']
       JOIN persons p ON p.id = m.person_id AND NOT p.is_disabled
       GROUP BY o.id, o.name ORDER BY o.name, o.id`,
      departmentId,
    );
  }

  /** Plans in force of lots whose stage has no open visit: a visit holds its plan to its own version. */
  async listStandingPlans(departmentId: string): Promise<StandingPlan[]> {
    return this.select(
      `SELECT DISTINCT l.id AS "lotId", l.number AS "lotNumber", t.name AS "tractName", p.stage_code AS "stageCode", p.system, p.method,
         p.medium, p.rule_card_id AS "ruleCardId"
       FROM test_plans p JOIN lots l ON l.id = p.lot_id LEFT JOIN tracts t ON t.id = l.tract_id
       WHERE l.department_id = :departmentId AND p.superseded_at IS NULL AND NOT EXISTS (
         SELECT 1 FROM visits v WHERE v.lot_id = l.id AND v.stage_code = p.stage_code AND v.state IN ${open})
       ORDER BY t.name, l.number, p.stage_code, p.system`,
      departmentId,
    );
  }

  private async select<Row extends object>(sql: string, departmentId: string): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements: { departmentId }, type: QueryTypes.SELECT });
  }
}
