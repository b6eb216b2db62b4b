import type { PlatDrawing } from '@holdwater/shared-types/lots/tract.contract.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A tract of a builder, with its drawn plat. */
@Table({ tableName: 'tracts', timestamps: false, underscored: true })
export class TractModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare builderId: string;

  @Column(DataType.TEXT)
  declare name: string;

  @Column(DataType.JSONB)
  declare plat: PlatDrawing | null;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
