import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Tract } from '@holdwater/shared-types/lots/tract.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { type Actor, organizationIds } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { isReadable } from './lot-record.js';

@Injectable()
export class TractsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Tracts of the actor's own builder and those with a lot the actor may read, by name; only such lots are counted. */
  async listFor(actor: Actor): Promise<Tract[]> {
    return this.select(actor, '', {});
  }

  /** Throws `not-found`, also for a tract the actor may not know of. */
  async getFor(actor: Actor, tractId: string): Promise<Tract> {
    const [found] = await this.select(actor, 'AND t.id = :tractId', { tractId });
    return found ?? refuse('not-found');
  }

  /** Every lot of a tract, whoever reads. */
  async listLotIds(tractId: string): Promise<string[]> {
    const found = await this.sequelize.query<{ id: string }>(
      'SELECT id FROM lots WHERE tract_id = :tractId ORDER BY id',
      {
        replacements: { tractId },
        type: QueryTypes.SELECT,
      },
    );
    return found.map(({ id }) => id);
  }

  private async select(actor: Actor, condition: string, replacements: Record<string, unknown>): Promise<Tract[]> {
    return this.sequelize.query<Tract>(
      `SELECT * FROM (
         SELECT t.id, t.name, t.builder_id AS "builderId", b.name AS "builderName", t.plat,
           (SELECT count(*)::int FROM lots l WHERE l.tract_id = t.id AND ${isReadable}) AS "lotCount"
         FROM tracts t JOIN organizations b ON b.id = t.builder_id WHERE true ${condition}
       ) tract WHERE "lotCount" > 0 OR "builderId" = ANY (ARRAY[:readerIds]::uuid[]) ORDER BY name, id`,
      { replacements: { ...replacements, readerIds: organizationIds(actor) }, type: QueryTypes.SELECT },
    );
  }
}
