import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One message to one address by one channel, until it is sent or given up. */
@Table({ tableName: 'deliveries', timestamps: false, underscored: true })
export class DeliveryModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare eventId: string;

  @Column(DataType.UUID)
  declare noticeId: string | null;

  @Column(DataType.UUID)
  declare personId: string | null;

  @Column(DataType.TEXT)
  declare channel: 'email';

  @Column(DataType.TEXT)
  declare kind: string;

  @Column(DataType.TEXT)
  declare address: string;

  @Column(DataType.TEXT)
  declare orderKey: string | null;

  @Column(DataType.TEXT)
  declare messageId: string;

  @Column(DataType.JSONB)
  declare payload: Record<string, unknown>;

  @Column(DataType.TEXT)
  declare state: 'waiting' | 'sent' | 'given-up' | 'dropped';

  @Column(DataType.INTEGER)
  declare attempts: number;

  @Column(DataType.DATE)
  declare nextAttemptAt: Date;

  @Column(DataType.DATE)
  declare claimedUntil: Date | null;

  @Column(DataType.TEXT)
  declare lastError: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.DATE)
  declare sentAt: Date | null;
}
