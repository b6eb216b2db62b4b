import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

export interface ClearanceRecord {
  readonly lotId: string;
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly state: ClearState;
  readonly since: Date;
}

/** How other modules read the state of plumbing. What has no row is `not-tested`. */
@Injectable()
export class ClearancesQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async listStates(lotIds: readonly string[]): Promise<ClearanceRecord[]> {
    return this.sequelize.query<ClearanceRecord>(
      `SELECT lot_id AS "lotId", unit_number AS "unitNumber", stage_code AS "stageCode", state, since FROM clearances
       WHERE lot_id = ANY (ARRAY[:lotIds]::uuid[]) ORDER BY lot_id, stage_code, unit_number`,
      { replacements: { lotIds: [...lotIds] }, type: QueryTypes.SELECT },
    );
  }

  async getState(lotId: string, unitNumber: number, stageCode: string): Promise<ClearState> {
    const states = await this.listStates([lotId]);
    return states.find((each) => each.unitNumber === unitNumber && each.stageCode === stageCode)?.state ?? 'not-tested';
  }
}
