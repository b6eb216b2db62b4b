import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { CorrectionState } from '@holdwater/shared-types/outcomes/correction.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { isReadable } from '../lots/lot-record.js';
import type { LotParties } from '../lots/lots.policy.js';

type Shown = Omit<Correction, 'abilities' | 'openedAt' | 'fixedAt' | 'acceptedAt'>;

/** A correction with the names it is shown with and the parties its policy looks at. */
export interface CorrectionRow extends Shown, LotParties {
  readonly openedAt: Date;
  readonly fixedAt: Date | null;
  readonly acceptedAt: Date | null;
}

export interface CorrectionFilter {
  readonly readerIds: readonly string[];
  readonly state?: CorrectionState;
  readonly lotId?: string;
  /** The last row of the page before. */
  readonly after?: { readonly openedAt: string; readonly number: number; readonly id: string };
  readonly limit: number;
}

const correctionSql = `
  SELECT c.id, c.lot_id AS "lotId", l.number AS "lotNumber", t.name AS "tractName", c.unit_number AS "unitNumber",
    c.stage_code AS "stageCode", c.visit_id AS "visitId", c.number, c.subject, c.point_code AS "pointCode", c.text, c.place, c.floor,
    c.room, c.severity, c.section, c.state, c.version, c.opened_at AS "openedAt", opener.name AS "openedBy", c.fixed_at AS "fixedAt",
    fixer.name AS "fixedBy", c.fix_note AS "fixNote", c.reopened_why AS "reopenedWhy", c.accepted_at AS "acceptedAt",
    accepter.name AS "acceptedBy", l.builder_id AS "builderId", l.plumber_id AS "plumberId", v.department_id AS "departmentId",
    l.may_plumber_request AS "mayPlumberRequest"
  FROM corrections c
  JOIN lots l ON l.id = c.lot_id
  JOIN visits v ON v.id = c.visit_id
  LEFT JOIN tracts t ON t.id = l.tract_id
  JOIN persons opener ON opener.id = c.opened_by
  LEFT JOIN persons fixer ON fixer.id = c.fixed_by
  LEFT JOIN persons accepter ON accepter.id = c.accepted_by`;

/** Reads corrections; the only way other modules reach them. Each list is one statement. */
@Injectable()
export class CorrectionsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** In the order they were counted. */
  async listOfLot(lotId: string): Promise<CorrectionRow[]> {
    return this.select('WHERE c.lot_id = :lotId ORDER BY c.number', { lotId });
  }

  async findById(id: string): Promise<CorrectionRow | null> {
    const [found] = await this.select('WHERE c.id = :id', { id });
    return found ?? null;
  }

  /** Of the lots of these organizations, newest first; one row more than the limit where there are more. */
  async listReadable({ readerIds, state, lotId, after, limit }: CorrectionFilter): Promise<CorrectionRow[]> {
    if (readerIds.length === 0) return [];
    const where = [
      isReadable,
      ...(state === undefined ? [] : ['c.state = :state']),
      ...(lotId === undefined ? [] : ['c.lot_id = :lotId']),
      ...(after === undefined
        ? []
        : ['(c.opened_at, c.number, c.id) < (CAST(:openedAt AS timestamptz), :number, CAST(:id AS uuid))']),
    ];
    return this.select(`WHERE ${where.join(' AND ')} ORDER BY c.opened_at DESC, c.number DESC, c.id DESC LIMIT :most`, {
      readerIds: [...readerIds],
      state,
      lotId,
      ...after,
      most: limit + 1,
    });
  }

  private async select(rest: string, replacements: Record<string, unknown>): Promise<CorrectionRow[]> {
    return this.sequelize.query<CorrectionRow>(`${correctionSql} ${rest}`, { replacements, type: QueryTypes.SELECT });
  }
}
