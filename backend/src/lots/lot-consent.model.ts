import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** An organization asked to join a lot, and its answer. */
@Table({ tableName: 'lot_consents', timestamps: false, underscored: true })
export class LotConsentModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.TEXT)
  declare kind: 'builder' | 'plumber' | 'department';

  @Column(DataType.UUID)
  declare organizationId: string;

  /** Whose place it is; null where there is none to replace. */
  @Column(DataType.UUID)
  declare replacesId: string | null;

  @Column(DataType.UUID)
  declare askedBy: string | null;

  @Column(DataType.DATE)
  declare askedAt: Date;

  @Column(DataType.UUID)
  declare answeredBy: string | null;

  @Column(DataType.DATE)
  declare answeredAt: Date | null;

  @Column(DataType.BOOLEAN)
  declare isJoining: boolean | null;

  @Column(DataType.TEXT)
  declare why: string | null;
}
