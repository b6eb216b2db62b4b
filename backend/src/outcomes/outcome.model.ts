import type { OutcomeKind } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** What a visit found. */
@Table({ tableName: 'outcomes', timestamps: false, underscored: true })
export class OutcomeModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare visitId: string;

  @Column(DataType.TEXT)
  declare kind: OutcomeKind;

  @Column(DataType.TEXT)
  declare reason: string | null;

  @Column(DataType.TEXT)
  declare note: string | null;

  @Column(DataType.DATE)
  declare madeAt: Date;

  @Column(DataType.DATE)
  declare receivedAt: Date;

  @Column(DataType.UUID)
  declare byPerson: string;
}
