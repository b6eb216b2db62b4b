import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A refresh token of a session, kept as its hash; one is current, the others were replaced. */
@Table({ tableName: 'refresh_tokens', timestamps: false, underscored: true })
export class RefreshTokenModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare sessionId: string;

  @Column(DataType.TEXT)
  declare tokenHash: string;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.DATE)
  declare replacedAt: Date | null;
}
