import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One sign-in of a person, until it ends. */
@Table({ tableName: 'sessions', timestamps: false, underscored: true })
export class SessionModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare personId: string;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.DATE)
  declare expiresAt: Date;

  @Column(DataType.DATE)
  declare endedAt: Date | null;

  @Column(DataType.TEXT)
  declare endReason: string | null;
}
