import type { ClearState } from '@holdwater/shared-types/clearances/clearance.rules.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** Plumbing of one lot, unit and stage, as last computed. */
@Table({ tableName: 'clearances', timestamps: false, underscored: true })
export class ClearanceModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare lotId: string;

  @PrimaryKey
  @Column(DataType.INTEGER)
  declare unitNumber: number;

  @PrimaryKey
  @Column(DataType.TEXT)
  declare stageCode: string;

  @Column(DataType.TEXT)
  declare state: ClearState;

  @Column(DataType.DATE)
  declare since: Date;
}
