import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { type Actor, organizationIds } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { briefColumns, briefTables, isReadable, type LotBrief, lotColumns, type LotRecord } from './lot-record.js';
import { canReadLot, type LotParties } from './lots.policy.js';

/** How other modules read lots. Missing and not to be seen look alike. */
@Injectable()
export class LotsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** A lot the actor may read. Throws `not-found`. */
  async getLotFor(actor: Actor, lotId: string): Promise<LotRecord> {
    return readable(actor, await this.findLot(lotId));
  }

  /** The same, its row locked until the unit of work ends. Throws `not-found`. */
  async lockLotFor(actor: Actor, lotId: string): Promise<LotRecord> {
    return readable(actor, await this.findLot(lotId, 'FOR NO KEY UPDATE'));
  }

  /** Locks a lot's row, whoever asks. Throws `not-found`. */
  async lockLot(lotId: string): Promise<LotRecord> {
    return (await this.findLot(lotId, 'FOR NO KEY UPDATE')) ?? refuse('not-found');
  }

  /** The parties of a lot, for a policy. Throws `not-found`. */
  async partiesOf(lotId: string): Promise<LotParties> {
    return (await this.findLot(lotId)) ?? refuse('not-found');
  }

  /** Several lots the actor may read, in the order asked; locked in order of id. Throws `not-found` when one is missing. */
  async lockLotsFor(actor: Actor, lotIds: readonly string[]): Promise<LotRecord[]> {
    const found = await this.select<LotRecord>(
      `SELECT ${lotColumns} FROM lots l WHERE l.id = ANY (ARRAY[:lotIds]::uuid[]) ORDER BY l.id FOR NO KEY UPDATE`,
      { lotIds: [...lotIds] },
    );
    return lotIds.map((lotId) => readable(actor, found.find(({ id }) => id === lotId) ?? null));
  }

  /** The ids of every lot the actor may read. */
  async listLotIdsFor(actor: Actor): Promise<string[]> {
    const found = await this.select<{ id: string }>(`SELECT l.id FROM lots l WHERE ${isReadable}`, {
      readerIds: organizationIds(actor),
    });
    return found.map(({ id }) => id);
  }

  /** What names each of these lots, by id; no check of who reads. */
  async listBriefs(lotIds: readonly string[]): Promise<Map<string, LotBrief>> {
    const found = await this.select<LotBrief>(
      `SELECT ${briefColumns} FROM ${briefTables} WHERE l.id = ANY (ARRAY[:lotIds]::uuid[])`,
      { lotIds: [...new Set(lotIds)] },
    );
    return new Map(found.map((brief) => [brief.id, brief]));
  }

  /** The unit numbers of each lot, in order. */
  async listUnitNumbers(lotIds: readonly string[]): Promise<Map<string, number[]>> {
    const found = await this.select<{ lotId: string; numbers: number[] }>(
      `SELECT lot_id AS "lotId", array_agg(number ORDER BY number) AS numbers FROM lot_units
       WHERE lot_id = ANY (ARRAY[:lotIds]::uuid[]) GROUP BY lot_id`,
      { lotIds: [...lotIds] },
    );
    return new Map(found.map(({ lotId, numbers }) => [lotId, numbers]));
  }

  private async findLot(lotId: string, lock: '' | 'FOR NO KEY UPDATE' = ''): Promise<LotRecord | null> {
    const [lot] = await this.select<LotRecord>(`SELECT ${lotColumns} FROM lots l WHERE l.id = :lotId ${lock}`, {
      lotId,
    });
    return lot ?? null;
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}

function readable(actor: Actor, lot: LotRecord | null): LotRecord {
  return lot !== null && canReadLot(actor, lot) ? lot : refuse('not-found');
}
