import type { HandoverKind } from '@holdwater/shared-types/lots/lot.contract.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** Who was on a lot until it was handed over, and what the lot was called then. Never changed. */
@Table({ tableName: 'lot_past_parties', timestamps: false, underscored: true })
export class PastPartyModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.TEXT)
  declare kind: HandoverKind;

  @Column(DataType.UUID)
  declare organizationId: string;

  @Column(DataType.UUID)
  declare replacedById: string;

  @Column(DataType.DATE)
  declare until: Date;

  @Column(DataType.INTEGER)
  declare untilSequence: number;

  @Column(DataType.TEXT)
  declare lotNumber: string;

  @Column(DataType.TEXT)
  declare tractName: string | null;

  @Column(DataType.TEXT)
  declare address: string;
}
