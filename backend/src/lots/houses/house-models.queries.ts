import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { HouseModelBrief } from '@holdwater/shared-types/lots/house-model.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../../common/access/actor.js';
import { refuse } from '../../common/errors/app-error.js';
import { canReadHouseModels } from './house-models.policy.js';

/** A model with its newest version. */
export interface HouseModelRecord {
  readonly id: string;
  readonly builderId: string;
  readonly name: string;
  readonly version: number;
  readonly geometry: HouseGeometry;
  readonly madeAt: Date;
  readonly madeByName: string;
}

export interface HouseVersionRecord {
  readonly version: number;
  readonly madeAt: Date;
  readonly madeByName: string;
}

/** How far a model is used, in units. */
export type HouseModelUse = HouseModelBrief['use'];
const unused: HouseModelUse = { units: 0, lots: 0, changed: 0, behind: 0 };

const columns = `m.id, m.builder_id AS "builderId", m.name, m.version, v.geometry, v.made_at AS "madeAt", p.name AS "madeByName"`;
const tables = `house_models m JOIN house_model_versions v ON v.model_id = m.id AND v.version = m.version
  JOIN persons p ON p.id = v.made_by`;

/** Reads house models. Missing and another builder's look alike. */
@Injectable()
export class HouseModelsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Those of a builder, by name. */
  async listOf(builderId: string): Promise<HouseModelRecord[]> {
    return this.select<HouseModelRecord>(
      `SELECT ${columns} FROM ${tables} WHERE m.builder_id = :builderId ORDER BY lower(m.name), m.id`,
      { builderId },
    );
  }

  /** Throws `not-found`. */
  async getFor(actor: Actor, modelId: string): Promise<HouseModelRecord> {
    return readable(actor, await this.find(modelId));
  }

  /**
   * The same, its row locked until the unit of work ends: `SHARE` while it is given to lots, so that it is neither changed nor removed
   * meanwhile. Throws `not-found`.
   */
  async lockFor(actor: Actor, modelId: string, lock: 'UPDATE' | 'SHARE'): Promise<HouseModelRecord> {
    // locked first and read next: joined rows are read as they were before the lock was waited for
    await this.select(`SELECT id FROM house_models WHERE id = :modelId FOR ${lock}`, { modelId });
    return this.getFor(actor, modelId);
  }

  /** From the newest back. */
  async listVersions(modelId: string): Promise<HouseVersionRecord[]> {
    return this.select<HouseVersionRecord>(
      `SELECT v.version, v.made_at AS "madeAt", p.name AS "madeByName" FROM house_model_versions v JOIN persons p ON p.id = v.made_by
       WHERE v.model_id = :modelId ORDER BY v.version DESC`,
      { modelId },
    );
  }

  /**
   * Of each model, on its builder's lots. Counted where the rows are: a builder may have tens of thousands of them. A part that only one of
   * two houses was saved with, since it was not known before, is no change while it says nothing.
   */
  async countUse(modelIds: readonly string[]): Promise<(modelId: string) => HouseModelUse> {
    const counted = await this.select<HouseModelUse & { modelId: string }>(
      `SELECT m.id AS "modelId", count(*)::int AS units, count(DISTINCT l.id)::int AS lots,
         count(*) FILTER (WHERE jsonb_strip_nulls(u.geometry) <> jsonb_strip_nulls(v.geometry))::int AS changed,
         count(*) FILTER (WHERE v.version < m.version)::int AS behind
       FROM lot_units u JOIN house_models m ON m.id = u.house_model_id JOIN lots l ON l.id = u.lot_id AND l.builder_id = m.builder_id
       JOIN house_model_versions v ON v.model_id = m.id AND v.version = u.house_model_version
       WHERE m.id = ANY (ARRAY[:modelIds]::uuid[]) GROUP BY m.id`,
      { modelIds: [...modelIds] },
    );
    const known = new Map(counted.map(({ modelId, ...use }) => [modelId, use]));
    return (modelId) => known.get(modelId) ?? unused;
  }

  private async find(modelId: string): Promise<HouseModelRecord | null> {
    const [found] = await this.select<HouseModelRecord>(`SELECT ${columns} FROM ${tables} WHERE m.id = :modelId`, {
      modelId,
    });
    return found ?? null;
  }

  private async select<Row extends object>(sql: string, replacements: Record<string, unknown>): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { replacements, type: QueryTypes.SELECT });
  }
}

function readable(actor: Actor, model: HouseModelRecord | null): HouseModelRecord {
  return model !== null && canReadHouseModels(actor, model.builderId) ? model : refuse('not-found');
}
