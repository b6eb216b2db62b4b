import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { mostUnitsListed } from '@holdwater/shared-types/lots/house-model.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

/** The house of one unit, with the version of the model it was taken from. */
export interface UnitHouse {
  readonly lotId: string;
  readonly lotNumber: string;
  readonly address: string;
  readonly tractName: string | null;
  readonly unitNumber: number;
  readonly unitLabel: string;
  readonly geometry: HouseGeometry | null;
  /** All five null for a house measured on its own, and for one whose model is a former builder's. */
  readonly modelId: string | null;
  readonly modelName: string | null;
  readonly modelVersion: number | null;
  readonly newestVersion: number | null;
  readonly modelGeometry: HouseGeometry | null;
}

/** A lot keeps its house when it goes to another builder, but not what it has to do with the former one's models. */
const select = `SELECT u.lot_id AS "lotId", l.number AS "lotNumber", l.address, t.name AS "tractName", u.number AS "unitNumber",
    u.label AS "unitLabel", u.geometry, m.id AS "modelId", m.name AS "modelName", m.version AS "newestVersion",
    v.version AS "modelVersion", v.geometry AS "modelGeometry"
  FROM lot_units u JOIN lots l ON l.id = u.lot_id LEFT JOIN tracts t ON t.id = l.tract_id
  LEFT JOIN house_models m ON m.id = u.house_model_id AND m.builder_id = l.builder_id
  LEFT JOIN house_model_versions v ON v.model_id = m.id AND v.version = u.house_model_version`;

/** By tract, then as people read numbers: 2, 10, 10B. */
const order = `t.name NULLS LAST, substring(l.number FROM '^[^0-9]*'),
  COALESCE(substring(l.number FROM '[0-9]+'), '0')::numeric, l.number, l.id, u.number`;

@Injectable()
export class UnitHousesQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** The units of these lots; no check of who reads. */
  async listOfLots(lotIds: readonly string[]): Promise<UnitHouse[]> {
    return this.rows(`${select} WHERE u.lot_id = ANY (ARRAY[:lotIds]::uuid[]) ORDER BY ${order}`, {
      lotIds: [...lotIds],
    });
  }

  /** The units taken from a model, those at an earlier version first; one more than a list shows where there are more. */
  async listOfModel(modelId: string): Promise<UnitHouse[]> {
    return this.rows(`${select} WHERE m.id = :modelId ORDER BY v.version = m.version, ${order} LIMIT :limit`, {
      modelId,
      limit: mostUnitsListed + 1,
    });
  }

  /** The units of a builder's lots in a tract, or in none; one more than a list shows where there are more. */
  async listOfTract(builderId: string, tractId: string | null): Promise<UnitHouse[]> {
    const inTract = tractId === null ? 'l.tract_id IS NULL' : 'l.tract_id = :tractId';
    return this.rows(`${select} WHERE l.builder_id = :builderId AND ${inTract} ORDER BY ${order} LIMIT :limit`, {
      builderId,
      tractId,
      limit: mostUnitsListed + 1,
    });
  }

  private async rows(sql: string, replacements: Record<string, unknown>): Promise<UnitHouse[]> {
    return this.sequelize.query<UnitHouse>(sql, { replacements, type: QueryTypes.SELECT });
  }
}
