import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

/** A closure that stands; clock times `07:30`, null for a whole day. */
export interface ClosureRecord {
  readonly id: string;
  readonly departmentId: string;
  readonly date: string;
  readonly from: string | null;
  readonly to: string | null;
  readonly why: string;
}

@Injectable()
export class ClosuresQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** The closures of a department from a day on, to another where given, both included, by day and time. */
  async listClosures(departmentId: string, fromDate: string, toDate: string | null = null): Promise<ClosureRecord[]> {
    return this.sequelize.query<ClosureRecord>(
      `SELECT id, department_id AS "departmentId", date::text AS date, to_char(from_time, 'HH24:MI') AS "from",
         to_char(to_time, 'HH24:MI') AS "to", why
       FROM department_closures
       WHERE department_id = :departmentId AND removed_at IS NULL AND date >= :fromDate AND (CAST(:toDate AS date) IS NULL OR date <= :toDate)
       ORDER BY date, from_time NULLS FIRST, id`,
      { replacements: { departmentId, fromDate, toDate }, type: QueryTypes.SELECT },
    );
  }
}
