import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { lotColumns, type LotRecord } from '../lots/lot-record.js';

export interface OpenCorrection {
  readonly lotId: string;
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly severity: 'fix-before-cover' | 'fix-before-final';
}

export interface UnitsOfLot {
  readonly lotId: string;
  readonly unitNumbers: number[];
}

/** What of some lots speaks for or against another visit. */
@Injectable()
export class RequestedLotsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Several lots at once, nothing locked. Whether somebody may read them is the caller's to ask. */
  async listLots(lotIds: readonly string[]): Promise<LotRecord[]> {
    return this.select(`SELECT ${lotColumns} FROM lots l WHERE l.id = ANY (ARRAY[:lotIds]::uuid[])`, {
      lotIds: [...lotIds],
    });
  }

  /** Corrections that still have to be fixed; notes ask for nothing. */
  async listOpenCorrections(lotIds: readonly string[]): Promise<OpenCorrection[]> {
    return this.select(
      `SELECT lot_id AS "lotId", unit_number AS "unitNumber", stage_code AS "stageCode", severity FROM corrections
       WHERE lot_id = ANY (ARRAY[:lotIds]::uuid[]) AND state = 'open' AND severity <> 'note'`,
      { lotIds: [...lotIds] },
    );
  }

  /** The open visits of a stage. */
  async listOpenVisits(lotIds: readonly string[], stageCode: string): Promise<UnitsOfLot[]> {
    return this.select(
      `SELECT lot_id AS "lotId", unit_numbers AS "unitNumbers" FROM visits
       WHERE lot_id = ANY (ARRAY[:lotIds]::uuid[]) AND stage_code = :stageCode AND state IN ('requested', 'booked', 'ready', 'underway')`,
      { lotIds: [...lotIds], stageCode },
    );
  }

  /** The visits of a stage that failed. */
  async listFailedVisits(lotIds: readonly string[], stageCode: string): Promise<UnitsOfLot[]> {
    return this.select(
      `SELECT v.lot_id AS "lotId", v.unit_numbers AS "unitNumbers" FROM visits v JOIN outcomes o ON o.visit_id = v.id
       WHERE v.lot_id = ANY (ARRAY[:lotIds]::uuid[]) AND v.stage_code = :stageCode AND o.kind = 'fail'`,
      { lotIds: [...lotIds], stageCode },
    );
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
