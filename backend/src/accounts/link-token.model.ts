import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A single-use link sent by mail, kept as its hash. */
@Table({ tableName: 'link_tokens', timestamps: false, underscored: true })
export class LinkTokenModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.TEXT)
  declare kind: 'sign-in' | 'reset' | 'invitation';

  @Column(DataType.TEXT)
  declare tokenHash: string;

  @Column(DataType.UUID)
  declare personId: string | null;

  @Column(DataType.UUID)
  declare invitationId: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.DATE)
  declare expiresAt: Date;

  @Column(DataType.DATE)
  declare usedAt: Date | null;
}
