import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { briefColumns, briefTables, isReadable, type LotBrief } from '../lots/lot-record.js';

/** A lot's stage whose corrections wait: open ones to be fixed, fixed ones to be looked at. */
export interface WaitingCorrections extends LotBrief {
  readonly stageCode: string;
  readonly open: number;
  readonly fixed: number;
}

/** A lot's stage that wants a window and has none coming. */
export interface WithoutWindow extends LotBrief {
  readonly stageCode: string;
}

/** Lots of one builder that ask one organization to join. */
export interface OpenConsents {
  readonly organizationId: string;
  readonly organizationName: string;
  readonly builderId: string;
  readonly count: number;
  /** Of the one lot, where it is one. */
  readonly lotId: string | null;
  readonly lotNumber: string | null;
  readonly tractName: string | null;
}

/** The most of one kind that is shown: nobody works through more of them in a morning. */
const most = 200;

@Injectable()
export class WaitingQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Notes ask for nothing and wait for nobody. */
  async listCorrections(readerIds: readonly string[]): Promise<WaitingCorrections[]> {
    return this.select(
      `SELECT ${briefColumns}, c.stage_code AS "stageCode", c.open, c.fixed
       FROM ${briefTables} JOIN (
         SELECT lot_id, stage_code, count(*) FILTER (WHERE state = 'open')::int AS open, count(*) FILTER (WHERE state = 'fixed')::int AS fixed
         FROM corrections WHERE state <> 'accepted' AND severity <> 'note' GROUP BY lot_id, stage_code
       ) c ON c.lot_id = l.id
       WHERE ${isReadable} ORDER BY t.name, l.number, l.id LIMIT ${most}`,
      { readerIds },
    );
  }

  /**
   * A stage not passed that somebody has worked for: a test stands, or the last visit was freed, declined, failed or came to nothing. Open
   * corrections come first, and what the requesting side withdrew itself waits for nobody. Visits of windows before `since` (a date) are past.
   */
  async listWithoutWindow(readerIds: readonly string[], since: string): Promise<WithoutWindow[]> {
    return this.select(
      `SELECT ${briefColumns}, w.stage_code AS "stageCode"
       FROM ${briefTables} JOIN (
         SELECT lot_id, stage_code FROM holds WHERE state = 'standing'
         UNION
         SELECT v.lot_id, v.stage_code FROM visits v LEFT JOIN outcomes oc ON oc.visit_id = v.id
         WHERE v.window_date >= CAST(:since AS date) AND v.lot_id IN (SELECT l.id FROM lots l WHERE ${isReadable})
           AND (v.state IN ('freed', 'declined') OR (v.state = 'closed' AND oc.kind <> 'pass'))
           AND NOT EXISTS (SELECT 1 FROM visits later WHERE later.lot_id = v.lot_id AND later.stage_code = v.stage_code
             AND later.requested_at > v.requested_at)
       ) w ON w.lot_id = l.id
       WHERE ${isReadable} AND l.department_id IS NOT NULL
         AND NOT EXISTS (SELECT 1 FROM visits v WHERE v.lot_id = l.id AND v.stage_code = w.stage_code
           AND v.state IN ('requested', 'booked', 'ready', 'underway'))
         AND NOT EXISTS (SELECT 1 FROM corrections c WHERE c.lot_id = l.id AND c.stage_code = w.stage_code
           AND c.state = 'open' AND c.severity <> 'note')
         AND EXISTS (SELECT 1 FROM lot_units u LEFT JOIN clearances s
             ON s.lot_id = u.lot_id AND s.unit_number = u.number AND s.stage_code = w.stage_code
           WHERE u.lot_id = l.id AND coalesce(s.state, 'not-tested') NOT IN ('clear', 'put-back-due'))
       ORDER BY t.name, l.number, l.id LIMIT ${most}`,
      { readerIds, since },
    );
  }

  /** What the reader's organizations are asked, and what their lots ask of others. */
  async listConsents(readerIds: readonly string[]): Promise<OpenConsents[]> {
    return this.select(
      `SELECT c.organization_id AS "organizationId", o.name AS "organizationName", l.builder_id AS "builderId", count(*)::int AS count,
         CASE WHEN count(*) = 1 THEN min(l.id::text) END AS "lotId", CASE WHEN count(*) = 1 THEN min(l.number) END AS "lotNumber",
         CASE WHEN count(*) = 1 THEN min(t.name) END AS "tractName"
       FROM lot_consents c JOIN lots l ON l.id = c.lot_id JOIN organizations o ON o.id = c.organization_id LEFT JOIN tracts t ON t.id = l.tract_id
       WHERE c.answered_at IS NULL
         AND (c.organization_id = ANY (ARRAY[:readerIds]::uuid[]) OR l.builder_id = ANY (ARRAY[:readerIds]::uuid[]))
       GROUP BY c.organization_id, o.name, l.builder_id ORDER BY o.name LIMIT ${most}`,
      { readerIds },
    );
  }

  private async select<Row extends object>(
    sql: string,
    { readerIds, ...others }: { readerIds: readonly string[]; since?: string },
  ): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, {
      replacements: { readerIds: [...readerIds], ...others },
      type: QueryTypes.SELECT,
    });
  }
}
