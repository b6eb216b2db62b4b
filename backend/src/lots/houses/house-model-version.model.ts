import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One version of a house model. Never edited: lots rest on it. */
@Table({ tableName: 'house_model_versions', timestamps: false, underscored: true })
export class HouseModelVersionModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare modelId: string;

  @PrimaryKey
  @Column({ type: DataType.INTEGER, field: 'version' })
  declare number: number;

  @Column(DataType.JSONB)
  declare geometry: HouseGeometry;

  @Column(DataType.UUID)
  declare madeBy: string;

  @Column(DataType.DATE)
  declare madeAt: Date;
}
