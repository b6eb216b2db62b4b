import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { TestPlanModel } from './test-plan.model.js';

/** The part of a lot that is planned for. */
export interface PlannedPart {
  readonly unitNumber: number;
  readonly stageCode: string;
  readonly system: System;
}

export interface UnitHouse {
  readonly number: number;
  readonly geometry: HouseGeometry | null;
}

/** The rule card version that an open visit of units at a stage was booked under. */
export interface VisitCard {
  readonly stageCode: string;
  readonly unitNumbers: number[];
  readonly ruleCardId: string;
}

/** Reads test plans; the only way other modules reach them. */
@Injectable()
export class PlansQueries {
  constructor(
    @InjectModel(TestPlanModel) private readonly plans: typeof TestPlanModel,
    @InjectConnection() private readonly sequelize: Sequelize,
  ) {}

  async findPlan(id: string): Promise<TestPlanModel | null> {
    return this.plans.findByPk(id);
  }

  async findByClientId(clientId: string): Promise<TestPlanModel | null> {
    return this.plans.findOne({ where: { clientId } });
  }

  /** The plan in force of a unit, stage and system; null where no method is chosen. */
  async findCurrent(lotId: string, { unitNumber, stageCode, system }: PlannedPart): Promise<TestPlanModel | null> {
    return this.plans.findOne({ where: { lotId, unitNumber, stageCode, system, supersededAt: null } });
  }

  /** The current plans of a lot, by unit, stage and system. */
  async listCurrent(lotId: string): Promise<TestPlanModel[]> {
    return this.plans.findAll({
      where: { lotId, supersededAt: null },
      order: [
        ['unitNumber', 'ASC'],
        ['stageCode', 'ASC'],
        ['system', 'ASC'],
      ],
    });
  }

  /** Every plan of a part, the newest first. */
  async listHistory(lotId: string, { unitNumber, stageCode, system }: PlannedPart): Promise<TestPlanModel[]> {
    return this.plans.findAll({
      where: { lotId, unitNumber, stageCode, system },
      order: [
        ['receivedAt', 'DESC'],
        ['id', 'ASC'],
      ],
    });
  }

  /** The units of a lot with their houses, in order. */
  async listHouses(lotId: string): Promise<UnitHouse[]> {
    return this.select<UnitHouse>('SELECT number, geometry FROM lot_units WHERE lot_id = :lotId ORDER BY number', {
      lotId,
    });
  }

  async listVisitCards(lotId: string): Promise<VisitCard[]> {
    return this.select<VisitCard>(
      `SELECT stage_code AS "stageCode", unit_numbers AS "unitNumbers", rule_card_id AS "ruleCardId" FROM visits
       WHERE lot_id = :lotId AND state IN (:openStates)`,
      { lotId, openStates: [...openVisitStates] },
    );
  }

  /** The names of people, by id. */
  async listNames(personIds: readonly string[]): Promise<Map<string, string>> {
    const found = await this.select<{ id: string; name: string }>(
      'SELECT id, name FROM persons WHERE id = ANY (ARRAY[:personIds]::uuid[])',
      { personIds: [...new Set(personIds)] },
    );
    return new Map(found.map(({ id, name }) => [id, name]));
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
