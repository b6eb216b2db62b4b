import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { openVisitStates, type VisitState } from '@holdwater/shared-types/visits/visit.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

export interface NextVisitRow {
  readonly lotId: string;
  readonly id: string;
  readonly state: VisitState;
  readonly startAt: Date;
  readonly endAt: Date;
  readonly zone: string;
}

/** What a list of lots tells of visits and corrections: one statement each for any number of lots. */
@Injectable()
export class LotProgressQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** By lot, its earliest open visit. */
  async listNextVisits(lotIds: readonly string[]): Promise<Map<string, NextVisitRow>> {
    const found = await this.select<NextVisitRow>(
      `SELECT DISTINCT ON (v.lot_id) v.lot_id AS "lotId", v.id, v.state, lower(v.window) AS "startAt", upper(v.window) AS "endAt", d.zone
       FROM visits v JOIN departments d ON d.id = v.department_id
       WHERE v.lot_id = ANY (ARRAY[:lotIds]::uuid[]) AND v.state IN (:openStates)
       ORDER BY v.lot_id, lower(v.window), v.id`,
      { lotIds: [...lotIds], openStates: [...openVisitStates] },
    );
    return new Map(found.map((row) => [row.lotId, row]));
  }

  /** By lot, how many corrections are open; those fixed wait on the inspector and are not counted. */
  async countOpenCorrections(lotIds: readonly string[]): Promise<Map<string, number>> {
    const found = await this.select<{ lotId: string; count: number }>(
      `SELECT lot_id AS "lotId", count(*)::int AS count FROM corrections
       WHERE lot_id = ANY (ARRAY[:lotIds]::uuid[]) AND state = 'open' GROUP BY lot_id`,
      { lotIds: [...lotIds] },
    );
    return new Map(found.map(({ lotId, count }) => [lotId, count]));
  }

  /** Whether an inspector is planned to come to a lot on a day of the department's calendar. */
  async isPlannedOn(lotId: string, inspectorId: string, date: string): Promise<boolean> {
    const found = await this.select(
      `SELECT 1 FROM visits WHERE lot_id = :lotId AND inspector_id = :inspectorId AND window_date = :date
         AND state IN ('booked', 'ready', 'underway') LIMIT 1`,
      { lotId, inspectorId, date },
    );
    return found.length > 0;
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
