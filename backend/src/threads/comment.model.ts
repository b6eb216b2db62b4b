import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One entry of a lot’s thread. */
@Table({ tableName: 'comments', timestamps: false, underscored: true })
export class CommentModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.TEXT)
  declare text: string;

  @Column(DataType.TEXT)
  declare onKind: 'visit' | 'correction' | 'hold' | null;

  @Column(DataType.UUID)
  declare onId: string | null;

  @Column(DataType.UUID)
  declare authorId: string;

  @Column(DataType.TEXT)
  declare authorRole: string | null;

  @Column(DataType.DATE)
  declare madeAt: Date;

  @Column(DataType.DATE)
  declare receivedAt: Date;
}
