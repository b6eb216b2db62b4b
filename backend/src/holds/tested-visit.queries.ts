import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

export interface TestedVisit {
  readonly id: string;
  readonly ruleCardId: string;
}

/** The open visit a test stands for. */
@Injectable()
export class TestedVisitQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** The open visit of a unit at a stage; there is one at most. */
  async findOpenVisit(lotId: string, unitNumber: number, stageCode: string): Promise<TestedVisit | null> {
    const [visit] = await this.sequelize.query<TestedVisit>(
      `SELECT id, rule_card_id AS "ruleCardId" FROM visits
       WHERE lot_id = :lotId AND stage_code = :stageCode AND :unitNumber = ANY (unit_numbers) AND state IN (:openStates)`,
      { replacements: { lotId, unitNumber, stageCode, openStates: [...openVisitStates] }, type: QueryTypes.SELECT },
    );
    return visit ?? null;
  }
}
