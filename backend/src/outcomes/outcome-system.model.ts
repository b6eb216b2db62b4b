import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { SystemAnswer } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** The answer to one system of one unit at a visit. */
@Table({ tableName: 'outcome_systems', timestamps: false, underscored: true })
export class OutcomeSystemModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare outcomeId: string;

  @Column(DataType.INTEGER)
  declare unitNumber: number;

  @Column(DataType.TEXT)
  declare system: System;

  @Column(DataType.TEXT)
  declare answer: SystemAnswer;

  @Column(DataType.TEXT)
  declare needle: string | null;

  @Column(DataType.DOUBLE)
  declare pressurePsi: number | null;

  @Column(DataType.DOUBLE)
  declare levelIn: number | null;

  @Column(DataType.TEXT)
  declare note: string | null;
}
