import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { LotParties } from '../lots/lots.policy.js';
import type { VisitModel } from './visit.model.js';

/** The lot of a visit as the policies need it. Its department is the visit's own. */
export interface VisitLot extends LotParties {
  readonly id: string;
  readonly number: string;
  readonly address: string;
}

@Injectable()
export class VisitLotQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Throws when the lot is gone, which foreign keys forbid. */
  async getLotOf(visit: Pick<VisitModel, 'lotId' | 'departmentId'>): Promise<VisitLot> {
    const [lot] = await this.sequelize.query<VisitLot>(
      `SELECT id, number, address, builder_id AS "builderId", plumber_id AS "plumberId", CAST(:departmentId AS uuid) AS "departmentId",
              may_plumber_request AS "mayPlumberRequest"
       FROM lots WHERE id = :lotId`,
      { replacements: { lotId: visit.lotId, departmentId: visit.departmentId }, type: QueryTypes.SELECT },
    );
    if (!lot) throw new Error(`visit of no lot ${visit.lotId}`);
    return lot;
  }
}
