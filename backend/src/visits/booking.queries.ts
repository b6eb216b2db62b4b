import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { BusySpan, Candidate } from './planned-span.js';

export interface TakenPlace {
  readonly date: string;
  readonly label: string;
  readonly place: number;
  /** Its test is up, or was when the inspector began. */
  readonly isUp: boolean;
}

/** What stands in a department's days: whom it could send, when they are busy, and which places are taken. */
@Injectable()
export class BookingQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Holds a day of a department against every other booking until the end of the transaction. */
  async lockDay(departmentId: string, date: string): Promise<void> {
    const replacements = { departmentId, date };
    await this.sequelize.query(
      'INSERT INTO department_days (department_id, date) VALUES (:departmentId, :date) ON CONFLICT DO NOTHING',
      {
        replacements,
        type: QueryTypes.INSERT,
      },
    );
    await this.sequelize.query(
      'SELECT 1 FROM department_days WHERE department_id = :departmentId AND date = :date FOR UPDATE',
      {
        replacements,
        type: QueryTypes.SELECT,
      },
    );
  }

  /** The inspectors in force, by name, with every organization they belong to. */
  async listInspectors(departmentId: string): Promise<Array<Candidate & { name: string; phone: string | null }>> {
    return this.sequelize.query(
      `SELECT p.id, p.name, p.phone,
         ARRAY(SELECT other.organization_id FROM memberships other WHERE other.person_id = p.id AND NOT other.is_disabled) AS "organizationIds"
       FROM memberships m JOIN persons p ON p.id = m.person_id
       WHERE m.organization_id = :departmentId AND 'inspector' = ANY (m.roles) AND NOT m.is_disabled AND NOT p.is_disabled
       ORDER BY p.name, p.id`,
      { replacements: { departmentId }, type: QueryTypes.SELECT },
    );
  }

  /** When these inspectors are planned to be anywhere between two instants, whichever department sends them. */
  async listBusy(
    inspectorIds: readonly string[],
    fromAt: Date,
    toAt: Date,
    exceptVisitId: string | null = null,
  ): Promise<BusySpan[]> {
    return this.sequelize.query<BusySpan>(
      `SELECT inspector_id AS "inspectorId", lower(planned) AS "startAt", upper(planned) AS "endAt" FROM visits
       WHERE inspector_id = ANY (ARRAY[:inspectorIds]::uuid[]) AND state IN ('booked', 'ready', 'underway')
         AND planned && tstzrange(:fromAt, :toAt) AND id IS DISTINCT FROM CAST(:exceptVisitId AS uuid)`,
      { replacements: { inspectorIds: [...inspectorIds], fromAt, toAt, exceptVisitId }, type: QueryTypes.SELECT },
    );
  }

  /** The places taken in a department's windows from one day to another, both included. */
  async listTaken(
    departmentId: string,
    fromDate: string,
    toDate: string,
    exceptVisitId: string | null = null,
  ): Promise<TakenPlace[]> {
    return this.sequelize.query<TakenPlace>(
      `SELECT window_date::text AS date, window_label AS label, place, (state = 'ready' OR begun_from IS NOT DISTINCT FROM 'ready') AS "isUp"
       FROM visits
       WHERE department_id = :departmentId AND window_date BETWEEN :fromDate AND :toDate AND state IN ('booked', 'ready', 'underway')
         AND id IS DISTINCT FROM CAST(:exceptVisitId AS uuid)`,
      { replacements: { departmentId, fromDate, toDate, exceptVisitId }, type: QueryTypes.SELECT },
    );
  }
}
