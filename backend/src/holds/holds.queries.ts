import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import { HoldModel } from './hold.model.js';
import { ReadingModel } from './reading.model.js';

/** A reading with the name of whoever made it. */
export interface NamedReading extends Omit<Reading, 'at' | 'receivedAt' | 'isStruck'> {
  readonly holdId: string;
  readonly madeAt: Date;
  readonly receivedAt: Date;
  readonly struckAt: Date | null;
}

export interface StandingHold {
  readonly hold: HoldModel;
  /** In the order they were made, struck ones included. */
  readonly readings: readonly ReadingModel[];
}

const namedReadings = `
  SELECT r.id, r.hold_id AS "holdId", r.made_at AS "madeAt", r.received_at AS "receivedAt", r.pressure_psi AS "pressurePsi",
    r.level_in AS "levelIn", r.temperature_f AS "temperatureF", r.gauge_valve AS "gaugeValve", r.note,
    p.name AS "byName", r.by_role AS "byRole", r.struck_at AS "struckAt", r.struck_why AS "struckWhy"
  FROM readings r JOIN persons p ON p.id = r.by_person
  WHERE r.hold_id IN (:holdIds)
  ORDER BY r.made_at, r.received_at, r.id`;

/** Reads tests and their logs; the only way other modules reach them. */
@Injectable()
export class HoldsQueries {
  constructor(
    @InjectModel(HoldModel) private readonly holds: typeof HoldModel,
    @InjectModel(ReadingModel) private readonly readings: typeof ReadingModel,
    @InjectConnection() private readonly sequelize: Sequelize,
  ) {}

  /** Newest first. */
  async listOfLot(lotId: string): Promise<HoldModel[]> {
    const order: Array<[string, string]> = [
      ['startedAt', 'DESC'],
      ['ordinal', 'DESC'],
      ['system', 'ASC'],
      ['unitNumber', 'ASC'],
    ];
    return this.holds.findAll({ where: { lotId }, order });
  }

  /** The readings of several tests, late arrivals in the place of the time they were made at. */
  async listNamedReadings(holdIds: readonly string[]): Promise<NamedReading[]> {
    if (holdIds.length === 0) return [];
    return this.sequelize.query<NamedReading>(namedReadings, {
      replacements: { holdIds: [...holdIds] },
      type: QueryTypes.SELECT,
    });
  }

  /** The standing tests of some units of a lot at a stage, locked until the end of the unit of work where asked for. */
  async listStanding(
    lotId: string,
    stageCode: string,
    unitNumbers: readonly number[],
    isLocking = false,
  ): Promise<StandingHold[]> {
    const holds = await this.holds.findAll({
      where: { lotId, stageCode, unitNumber: [...unitNumbers], state: 'standing' },
      order: [['id', 'ASC']],
      lock: isLocking,
    });
    const readings = await this.readings.findAll({
      where: { holdId: holds.map((hold) => hold.id) },
      order: [
        ['madeAt', 'ASC'],
        ['receivedAt', 'ASC'],
        ['id', 'ASC'],
      ],
    });
    return holds.map((hold) => ({ hold, readings: readings.filter((reading) => reading.holdId === hold.id) }));
  }

  /** The standing test of one system, locked. */
  async lockStanding(lotId: string, unitNumber: number, stageCode: string, system: System): Promise<HoldModel | null> {
    return this.holds.findOne({ where: { lotId, unitNumber, stageCode, system, state: 'standing' }, lock: true });
  }

  /** How many tests of this unit, stage and system there were. */
  async lastOrdinal(lotId: string, unitNumber: number, stageCode: string, system: System): Promise<number> {
    const last = await this.holds.max<number | null, HoldModel>('ordinal', {
      where: { lotId, unitNumber, stageCode, system },
    });
    return last ?? 0;
  }
}
