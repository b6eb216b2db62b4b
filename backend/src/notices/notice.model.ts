import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One message to one person on the page. */
@Table({ tableName: 'notices', timestamps: false, underscored: true })
export class NoticeModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare eventId: string;

  @Column(DataType.UUID)
  declare personId: string;

  @Column(DataType.TEXT)
  declare kind: string;

  @Column(DataType.JSONB)
  declare params: Record<string, unknown>;

  @Column(DataType.UUID)
  declare lotId: string | null;

  @Column(DataType.UUID)
  declare visitId: string | null;

  @Column(DataType.DATE)
  declare at: Date;

  @Column(DataType.DATE)
  declare readAt: Date | null;
}
