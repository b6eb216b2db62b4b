import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';
import { isVisitReadable, type VisitRow, visitRowSql } from './visit-row.js';

export interface DaySpan {
  readonly fromDate: string;
  readonly toDate: string;
}

/** How visits are read, here and by other modules. Each list is one statement. */
@Injectable()
export class VisitsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Throws `not-found`. Whether somebody may read it is the caller's to ask. */
  async getVisit(id: string): Promise<VisitRow> {
    return (await this.listByIds([id]))[0] ?? refuse('not-found');
  }

  /** In the order of the ids; unknown ones are left out. */
  async listByIds(ids: readonly string[]): Promise<VisitRow[]> {
    const found = await this.select('v.id = ANY (ARRAY[:ids]::uuid[])', 'v.id', { ids: [...ids] });
    return ids.flatMap((id) => found.filter((row) => row.id === id));
  }

  /** Every visit of a lot, newest first. */
  async listOfLot(lotId: string): Promise<VisitRow[]> {
    return this.select('v.lot_id = :lotId', 'v.requested_at DESC, v.id', { lotId });
  }

  /** What waits for a desk to place: first those that were not reached, then the oldest. */
  async listRequests(departmentId: string, onDate: string | null = null): Promise<VisitRow[]> {
    const where = `v.department_id = :departmentId AND v.state = 'requested' AND (CAST(:onDate AS date) IS NULL OR v.window_date = :onDate)`;
    return this.select(where, 'v.has_first_place DESC, v.requested_at, v.id', { departmentId, onDate });
  }

  /** Visits of these organizations' lots from one day to another, in whatever state, by time. */
  async listInSpan(organizationIds: readonly string[], { fromDate, toDate }: DaySpan): Promise<VisitRow[]> {
    const where = `v.window_date BETWEEN :fromDate AND :toDate AND ${isVisitReadable}`;
    return this.select(where, 'lower(v."window"), lower(v.planned), v.id', {
      readerIds: [...organizationIds],
      fromDate,
      toDate,
    });
  }

  /** An inspector's visits of a day in planned order: those to come, underway and done. */
  async listRun(departmentId: string, inspectorId: string, date: string): Promise<VisitRow[]> {
    const where = `v.department_id = :departmentId AND v.inspector_id = :inspectorId AND ${ofDay}`;
    return this.select(where, 'lower(v.planned), v.id', { departmentId, inspectorId, date });
  }

  /** Every visit of a department's day that an inspector has or had, in planned order. */
  async listDay(departmentId: string, date: string): Promise<VisitRow[]> {
    return this.select(`v.department_id = :departmentId AND ${ofDay}`, 'lower(v.planned), v.id', {
      departmentId,
      date,
    });
  }

  /** Booked visits whose windows start between two instants: those a deadline may have passed for. */
  async listBookedStarting(fromAt: Date, toAt: Date): Promise<VisitRow[]> {
    return this.select(
      `v.state = 'booked' AND lower(v."window") BETWEEN :fromAt AND :toAt`,
      'lower(v."window"), v.id',
      { fromAt, toAt },
    );
  }

  /** Planned visits of these organizations' lots, by time: what a test or an inspector is waited for at. */
  async listOpen(organizationIds: readonly string[]): Promise<VisitRow[]> {
    const where = `v.state IN ('requested', 'booked', 'ready', 'underway') AND ${isVisitReadable}`;
    return this.select(where, 'lower(v."window"), v.id', { readerIds: [...organizationIds] });
  }

  /** When a visit last became booked as it stands, by the ledger: placed, moved, or its test said down again; null when it never did. */
  async findBookedAt(visitId: string): Promise<Date | null> {
    const [found] = await this.sequelize.query<{ at: Date | null }>(
      `SELECT max(e.at) AS at FROM visits v JOIN ledger_entries e ON e.lot_id = v.lot_id
       WHERE v.id = :visitId AND e.kind IN ('visit-booked', 'visit-moved', 'visit-restored', 'no-longer-up') AND e.payload ->> 'visitId' = CAST(v.id AS text)`,
      { replacements: { visitId }, type: QueryTypes.SELECT },
    );
    return found?.at ?? null;
  }

  /** Whether a visit was freed by its deadline and by nobody, by the ledger: the desk frees for reasons of its own. */
  async isFreedByDeadline(visitId: string): Promise<boolean> {
    const found = await this.sequelize.query(
      `SELECT 1 FROM visits v JOIN ledger_entries e ON e.lot_id = v.lot_id
       WHERE v.id = :visitId AND v.state = 'freed' AND e.kind = 'visit-freed' AND e.actor_id IS NULL
         AND e.payload ->> 'visitId' = CAST(v.id AS text) AND e.payload ->> 'reason' = 'not-up'`,
      { replacements: { visitId }, type: QueryTypes.SELECT },
    );
    return found.length > 0;
  }

  private async select(where: string, order: string, replacements: Record<string, unknown>): Promise<VisitRow[]> {
    return this.sequelize.query<VisitRow>(`${visitRowSql} WHERE ${where} ORDER BY ${order}`, {
      replacements,
      type: QueryTypes.SELECT,
    });
  }
}

const ofDay = `v.window_date = :date AND v.state IN ('booked', 'ready', 'underway', 'closed')`;
