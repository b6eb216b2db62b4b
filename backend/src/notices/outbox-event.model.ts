import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** What happened, written with the change itself; expanded into notices and deliveries afterwards. */
@Table({ tableName: 'outbox_events', timestamps: false, underscored: true })
export class OutboxEventModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.TEXT)
  declare kind: string;

  @Column(DataType.UUID)
  declare lotId: string | null;

  @Column(DataType.UUID)
  declare visitId: string | null;

  @Column(DataType.UUID)
  declare actorId: string | null;

  @Column(DataType.JSONB)
  declare payload: Record<string, unknown>;

  @Column(DataType.DATE)
  declare at: Date;

  @Column(DataType.BOOLEAN)
  declare isMuted: boolean;

  @Column(DataType.DATE)
  declare processedAt: Date | null;

  @Column(DataType.INTEGER)
  declare attempts: number;

  @Column(DataType.DATE)
  declare nextAttemptAt: Date;

  @Column(DataType.TEXT)
  declare lastError: string | null;
}
