import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A dwelling in the house of a lot, with its own geometry and tests. */
@Table({ tableName: 'lot_units', timestamps: false, underscored: true })
export class LotUnitModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.INTEGER)
  declare number: number;

  @Column(DataType.TEXT)
  declare label: string;

  @Column(DataType.JSONB)
  declare geometry: HouseGeometry | null;

  /** The version of a house model it was taken from; both or neither. */
  @Column(DataType.UUID)
  declare houseModelId: string | null;

  @Column(DataType.INTEGER)
  declare houseModelVersion: number | null;
}
